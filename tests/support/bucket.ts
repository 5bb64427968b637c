import { join } from 'node:path';
import S3rver from 's3rver';
import { BucketStorage } from '#server/storage/bucket-storage.ts';

/** A local store that speaks S3, with one empty bucket; all of it lies in `folder`. */
export const startBucket = async (folder: string) => {
  const s3 = new S3rver({
    port: 0,
    address: '127.0.0.1',
    silent: true,
    directory: join(folder, 's3'),
    configureBuckets: [{ name: 'clips', configs: [] }],
  });
  const { port } = await s3.run();
  return {
    /** Its storage; of another name than the bucket's it leads nowhere. */
    open: (bucket = 'clips') =>
      BucketStorage.open({
        bucket,
        endpoint: `http://127.0.0.1:${port}`,
        region: 'us-east-1',
        localRoot: join(folder, `work-${bucket}`),
        credentials: { accessKeyId: 'S3RVER', secretAccessKey: 'S3RVER' },
      }),
    close: () => s3.close(),
  };
};
