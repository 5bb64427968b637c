/**
 * Answers only at whole steps of time after the question, so that how long the work took tells nothing about what
 * it found.
 */
export const atSameTime = async <T>(stepMs: number, work: () => Promise<T>): Promise<T> => {
  const began = performance.now();
  try {
    return await work();
  } finally {
    const took = performance.now() - began;
    await new Promise((resolve) => setTimeout(resolve, Math.ceil(took / stepMs) * stepMs - took));
  }
};
