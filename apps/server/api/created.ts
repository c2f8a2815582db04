import { type Reply } from '../http';

/** Says where what was just made is to be found, and hands it on as the answer. */
export function created<T extends { readonly id: string }>(reply: Reply, collection: string, made: T): T {
  reply.setHeader('Location', `/api/${collection}/${made.id}`);
  return made;
}
