import * as z from 'zod';
import { protocolBody } from '#shared/contracts/protocol.ts';
import { degrees } from '#shared/geometry/units.ts';
import { inHundred, type FigureKey, protocolFaults } from '#shared/protocol/bounds.ts';
import type { Protocol } from '#shared/protocol/protocol.ts';

const figure = z.number('Write a number.');

/** Figures as they are typed: probabilities in 100. */
const fields = z.object({
  gateFrom: figure,
  gateTo: figure,
  fromBelow: figure,
  fromAbove: figure,
  toBelow: figure,
  toAbove: figure,
  liftShort: figure,
  early: figure,
  before: figure,
  turnIn: figure,
  flat: figure,
  reps: figure,
  framesPerSecond: figure,
  thighTurnsLittle: z.boolean(),
  /** Empty: none. */
  setUpId: z.string(),
  note: protocolBody.shape.note,
});
export type ProtocolFields = z.infer<typeof fields>;

const share = (given: number): number => Math.round(given * 10) / 1000;

export const valuesOf = (given: Omit<ProtocolFields, 'note'>): Protocol => ({
  gateFrom: degrees(given.gateFrom),
  gateTo: degrees(given.gateTo),
  fromBelow: degrees(given.fromBelow),
  fromAbove: degrees(given.fromAbove),
  toBelow: degrees(given.toBelow),
  toAbove: degrees(given.toAbove),
  liftShort: degrees(given.liftShort),
  early: share(given.early),
  before: share(given.before),
  turnIn: share(given.turnIn),
  flat: share(given.flat),
  reps: given.reps,
  framesPerSecond: given.framesPerSecond,
  thighTurnsLittle: given.thighTurnsLittle,
  setUpId: given.setUpId === '' ? null : given.setUpId,
});

export const fieldsOf = (values: Protocol): ProtocolFields => ({
  ...values,
  early: inHundred(values.early),
  before: inHundred(values.before),
  turnIn: inHundred(values.turnIn),
  flat: inHundred(values.flat),
  setUpId: values.setUpId ?? '',
  note: '',
});

/** The same rules as the contract, at the fields as they are typed. */
export const protocolForm = fields.superRefine((given, context) => {
  for (const { key, message } of protocolFaults(valuesOf(given)))
    context.addIssue({ code: 'custom', path: [key], message });
});

const UNITS: Partial<Record<FigureKey, string>> = {
  early: 'in 100',
  before: 'in 100',
  turnIn: 'in 100',
  flat: 'in 100',
  reps: 'reps',
  framesPerSecond: 'a second',
};
export const unitOf = (key: FigureKey): string => UNITS[key] ?? '°';
