/** A person as cases show them. */
import type { members } from '../schema/people';

type Person = Pick<typeof members, 'id' | 'name' | 'role'>;

/** Columns that make a person out of the table of members, or out of an alias of it. */
export const personColumns = <T extends { [K in keyof Person]: unknown }>(table: T): Pick<T, 'id' | 'name' | 'role'> => ({
  id: table.id,
  name: table.name,
  role: table.role,
});
