import { parentPort } from 'node:worker_threads';
import { deriveReading } from '#shared/reading/derive.ts';
import type { Answer, Ask } from './derive-apart.ts';

const answerTo = ({ id, input }: Ask): Answer => {
  try {
    return { id, result: deriveReading(input) };
  } catch (error) {
    return { id, error: error instanceof Error ? error.message : String(error) };
  }
};

parentPort?.on('message', (ask: Ask) => {
  parentPort?.postMessage(answerTo(ask));
});
