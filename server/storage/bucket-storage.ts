import { createReadStream, createWriteStream } from 'node:fs';
import { mkdir, rm, stat } from 'node:fs/promises';
import { join } from 'node:path';
import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import {
  DeleteObjectCommand,
  DeleteObjectsCommand,
  GetObjectCommand,
  HeadBucketCommand,
  HeadObjectCommand,
  ListObjectsV2Command,
  PutObjectCommand,
  S3Client,
} from '@aws-sdk/client-s3';
import {
  type ByteRange,
  checkedKey,
  MissingFile,
  type Storage,
  type StoredFile,
  type UseLocalFile,
} from './storage.ts';
import { TempDirs } from './temp-dirs.ts';

export interface BucketOptions {
  readonly bucket: string;
  readonly endpoint?: string | undefined;
  readonly region: string;
  /** A local folder for uploads under way and for programs that seek. */
  readonly localRoot: string;
  /** From the usual environment variables where left out. */
  readonly credentials?: { readonly accessKeyId: string; readonly secretAccessKey: string };
}

const isMissing = (error: unknown): boolean =>
  error instanceof Error && ['NotFound', 'NoSuchKey'].includes(error.name);

/** Files in an S3-compatible bucket. One request puts a file of up to 5 GB; uploads end at 2 GB. */
export class BucketStorage implements Storage {
  readonly incoming: string;
  readonly #client: S3Client;
  readonly #bucket: string;
  readonly #temp: TempDirs;

  private constructor(options: BucketOptions) {
    this.#bucket = options.bucket;
    this.incoming = join(options.localRoot, 'incoming');
    this.#temp = new TempDirs(join(options.localRoot, 'temp'));
    this.#client = new S3Client({
      region: options.region,
      ...(options.endpoint ? { endpoint: options.endpoint, forcePathStyle: true } : {}),
      ...(options.credentials ? { credentials: options.credentials } : {}),
      // Otherwise streams are sent in signed chunks, which some stores keep as part of the file.
      requestChecksumCalculation: 'WHEN_REQUIRED',
      responseChecksumValidation: 'WHEN_REQUIRED',
    });
  }

  static async open(options: BucketOptions): Promise<BucketStorage> {
    const storage = new BucketStorage(options);
    await mkdir(storage.incoming, { recursive: true, mode: 0o700 });
    await storage.#temp.clear();
    return storage;
  }

  #at(key: string): { Bucket: string; Key: string } {
    return { Bucket: this.#bucket, Key: checkedKey(key) };
  }

  async putFile(key: string, localPath: string, contentType: string): Promise<void> {
    await this.#put(key, localPath, contentType);
    await rm(localPath, { force: true });
  }

  async #put(key: string, localPath: string, contentType: string): Promise<void> {
    const { size } = await stat(localPath);
    await this.#client.send(
      new PutObjectCommand({
        ...this.#at(key),
        Body: createReadStream(localPath),
        ContentLength: size,
        ContentType: contentType,
      }),
    );
  }

  /** By way of a local file: a stream's length, which the store asks for first, is not known. */
  async putStream(key: string, stream: Readable, contentType: string): Promise<void> {
    await this.#temp.with(async (folder) => {
      const path = join(folder, 'stream');
      await pipeline(stream, createWriteStream(path, { mode: 0o600 }));
      await this.putFile(key, path, contentType);
    });
  }

  async stat(key: string): Promise<StoredFile> {
    try {
      const head = await this.#client.send(new HeadObjectCommand(this.#at(key)));
      return { bytes: head.ContentLength ?? 0, modified: head.LastModified ?? new Date(0) };
    } catch (error) {
      throw isMissing(error) ? new MissingFile(key) : error;
    }
  }

  async read(key: string, range?: ByteRange): Promise<Readable> {
    try {
      const { Body } = await this.#client.send(
        new GetObjectCommand({
          ...this.#at(key),
          ...(range ? { Range: `bytes=${range.start}-${range.end}` } : {}),
        }),
      );
      if (!(Body instanceof Readable)) throw new Error('The store sent no body.');
      return Body;
    } catch (error) {
      throw isMissing(error) ? new MissingFile(key) : error;
    }
  }

  async exists(key: string): Promise<boolean> {
    return this.stat(key).then(
      () => true,
      (error: unknown) => {
        if (error instanceof MissingFile) return false;
        throw error;
      },
    );
  }

  async delete(key: string): Promise<void> {
    await this.#client.send(new DeleteObjectCommand(this.#at(key)));
  }

  async deleteAll(prefix: string): Promise<void> {
    for (;;) {
      const page = await this.#client.send(
        new ListObjectsV2Command({ Bucket: this.#bucket, Prefix: `${checkedKey(prefix)}/` }),
      );
      const keys = (page.Contents ?? []).flatMap(({ Key }) => (Key === undefined ? [] : [{ Key }]));
      if (keys.length === 0) return;
      await this.#client.send(
        new DeleteObjectsCommand({ Bucket: this.#bucket, Delete: { Objects: keys, Quiet: true } }),
      );
    }
  }

  async withLocalFile<T>(key: string, use: UseLocalFile<T>): Promise<T> {
    return this.#temp.with(async (folder) => {
      const path = join(folder, key.split('/').at(-1) ?? 'file');
      await pipeline(await this.read(key), createWriteStream(path, { mode: 0o600 }));
      return use(path, () => this.#replace(key, path));
    });
  }

  /** Another content under the same key and type; the local file stays. */
  async #replace(key: string, localPath: string): Promise<void> {
    const { ContentType } = await this.#client.send(new HeadObjectCommand(this.#at(key)));
    await this.#put(key, localPath, ContentType ?? 'application/octet-stream');
  }

  withTempDir<T>(use: (path: string) => Promise<T>): Promise<T> {
    return this.#temp.with(use);
  }

  async healthy(): Promise<boolean> {
    return this.#client.send(new HeadBucketCommand({ Bucket: this.#bucket })).then(
      () => true,
      () => false,
    );
  }
}
