import { type Static, Type } from 'typebox';
import { oneOf, Uuid } from './common.ts';
import { roles } from './permissions.ts';

const RoleName = oneOf([...roles]);

export const SignIn = Type.Object({
  email: Type.String({ minLength: 3, maxLength: 254 }),
  password: Type.String({ minLength: 1, maxLength: 1024 }),
}, { additionalProperties: false });
export type SignIn = Static<typeof SignIn>;

export const Session = Type.Object({
  person: Type.Object({ id: Uuid, name: Type.String(), email: Type.String() }),
  organisation: Type.Object({ id: Uuid, name: Type.String() }),
  roles: Type.Array(RoleName),
});
export type Session = Static<typeof Session>;
