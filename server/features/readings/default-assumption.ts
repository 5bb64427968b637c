/** SQL: whether a side that begins now takes the planted thigh as turning little, by the protocol as it stands. */
export const DEFAULT_ASSUMPTION = `coalesce((
  select ("values" ->> 'thighTurnsLittle')::boolean from protocol_version
  where practice_id = current_practice() order by version desc limit 1
), false)`;
