import type { Call as CallShape } from '#shared/contracts/calls.ts';
import { degrees } from '#shared/geometry/units.ts';
import { presentPerson } from '../accounts/accounts.presenter.ts';
import type { Call } from './call.entity.ts';

/** @param call with `by` loaded */
export const presentCall = (call: Call): CallShape => ({
  id: call.id,
  visitId: call.visit.id,
  side: call.side,
  seen: call.seen,
  substitutions: call.substitutions,
  confidence: call.confidence,
  handsFelt: call.handsFelt,
  by: presentPerson(call.by.unwrap()),
  at: call.at.toISOString(),
  beforeFigures: call.beforeFigures,
  gates: { from: degrees(call.gateFrom), to: degrees(call.gateTo) },
});
