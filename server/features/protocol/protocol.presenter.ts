import type {
  ProtocolRef,
  ProtocolVersion as ProtocolVersionShape,
} from '#shared/contracts/protocol.ts';
import { rulesOf } from '#shared/protocol/protocol.ts';
import { presentPerson } from '../accounts/accounts.presenter.ts';
import type { ProtocolVersion } from './protocol-version.entity.ts';

export const presentProtocolRef = ({ version, at }: ProtocolVersion): ProtocolRef => ({
  version,
  at: at.toISOString(),
});

/** A version as those need it who read by it. */
export const presentRules = (version: ProtocolVersion) => ({
  ...presentProtocolRef(version),
  rules: rulesOf(version.values),
});

/** @param version with `by` loaded */
export const presentProtocol = (version: ProtocolVersion): ProtocolVersionShape => ({
  ...presentProtocolRef(version),
  values: version.values,
  by: version.by ? presentPerson(version.by.unwrap()) : null,
  note: version.note,
});
