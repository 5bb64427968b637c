export * from '#shared/records/stored-marks.ts';
