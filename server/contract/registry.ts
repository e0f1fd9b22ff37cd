/** Members of the department, its scanners and their coils. */
import { z } from 'zod';
import { everyMember, identifier, route } from './route';
import { memberSchema } from './session';

export const coilSchema = z.object({
  id: identifier,
  name: z.string(),
  serial: z.string(),
  elements: z.number().int(),
});
export const scannerSchema = z.object({
  id: identifier,
  name: z.string(),
  manufacturer: z.string(),
  model: z.string(),
  fieldStrengthTesla: z.number(),
  serial: z.string(),
  softwareVersion: z.string(),
  room: z.string(),
  coils: z.array(coilSchema),
  openCases: z.number().int(),
});
export type Scanner = z.infer<typeof scannerSchema>;

export const listMembers = route({
  method: 'get',
  path: '/api/members',
  summary: 'Members of the own department',
  access: everyMember,
  output: z.array(memberSchema),
});
export const listScanners = route({
  method: 'get',
  path: '/api/scanners',
  summary: 'Scanners of the own department with their coils',
  access: everyMember,
  output: z.array(scannerSchema),
});
