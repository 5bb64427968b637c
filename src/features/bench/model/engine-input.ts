export * from '#shared/records/engine-input.ts';
