import { etagOf, eventUid } from './identity';

it('makes one identity of one identifier, in the form of a UUID without any host', () => {
  const uid = eventUid('a');
  expect(uid).toBe(eventUid('a'));
  expect(uid).not.toBe(eventUid('b'));
  expect(uid).toMatch(/^[0-9a-f]{8}-[0-9a-f]{4}-8[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/);
});

it('makes a quoted tag that differs where the text does', () => {
  expect(etagOf('a')).toMatch(/^"[\w-]{27}"$/);
  expect(etagOf('a')).toBe(etagOf('a'));
  expect(etagOf('a')).not.toBe(etagOf('a '));
});
