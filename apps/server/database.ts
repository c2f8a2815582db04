import { Inject } from '@nestjs/common';

/** Injection token of the open database. */
export const DATABASE = Symbol('database');

/** Takes the open database as a constructor's argument. */
export const OpenDatabase = (): ParameterDecorator => Inject(DATABASE);
