import type { Config } from '../main/config.ts';
import { BucketStorage } from './bucket-storage.ts';
import { LocalStorage } from './local-storage.ts';
import type { Storage } from './storage.ts';

/** A bucket where one is named, otherwise the uploads folder. */
export const openStorage = ({
  bucket,
  uploads,
}: Pick<Config, 'bucket' | 'uploads'>): Promise<Storage> =>
  bucket
    ? BucketStorage.open({
        bucket: bucket.name,
        endpoint: bucket.endpoint,
        region: bucket.region,
        localRoot: uploads,
      })
    : LocalStorage.open(uploads);
