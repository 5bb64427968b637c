import type { Router } from 'express';
import type { Serve } from '../http/serve.ts';
import type { Ground } from './ground.ts';

/** A feature's routes: a table of contents. `router` is for protocols that no contract describes (tus). */
export type Feature = (tools: {
  readonly serve: Serve;
  readonly router: Router;
  readonly ground: Ground;
}) => void;
