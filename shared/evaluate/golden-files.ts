import { readdirSync, readFileSync } from 'node:fs';

const FOLDER = new URL('../../tests/fixtures/golden/', import.meta.url);

/** Reference of one rep with one landmark set, as the files hold it. */
export interface GoldenRep {
  readonly ok: boolean;
  readonly Fmax: number;
  readonly F: readonly number[];
  readonly psi_f: readonly number[];
  readonly psi_p: readonly number[];
  readonly R: readonly number[];
  readonly w: readonly number[] | null;
  readonly beta: readonly number[] | null;
  readonly d: number | null;
  readonly u_rand: number | null;
}

type Figure = 'd' | 'u' | 'nu' | 'm' | 's' | 'p_er' | 'p_ir' | 'p_flat' | 'p_pre' | 'pre' | 'MDT90';

export type GoldenReference = Readonly<Record<Figure, number | null>> & {
  readonly verdict: string;
  readonly kappa: number | null;
  readonly onset: readonly [number, number, number] | null;
  readonly reps: readonly GoldenRep[];
};

export interface GoldenFile {
  readonly id: string;
  readonly truth: { readonly dR_60_90: number; readonly verdict_class: string };
  readonly reps: readonly {
    readonly frames: readonly {
      readonly phase: string;
      /** By the files' own names, px. */
      readonly marks: Readonly<Record<string, readonly number[]>>;
      readonly truth: { readonly F: number; readonly R: number };
    }[];
    readonly truth: { readonly dR_60_90: number };
  }[];
  readonly reference: Readonly<Record<string, GoldenReference>>;
}

/** The thirteen synthetic trials with truth and the reference results of engine 1. */
export const goldenFiles = (): readonly GoldenFile[] =>
  readdirSync(FOLDER)
    .filter((name) => name.endsWith('.json'))
    .sort()
    .map((name) => JSON.parse(readFileSync(new URL(name, FOLDER), 'utf8')) as GoldenFile);

export const READING_OF: Readonly<Record<string, string>> = {
  early_er: 'early-turn-out',
  expected_turn: 'expected-turn-in',
  flat: 'holds-still',
  no_clear_turn: 'cannot-tell',
  range_not_reached: 'lift-stops-short',
  not_measurable: 'not-measurable',
};
