/** What the tests use of the local S3 server, which ships without types. */
declare module 's3rver' {
  export default class S3rver {
    constructor(options: {
      port: number;
      address: string;
      silent: boolean;
      directory: string;
      configureBuckets: { name: string; configs: string[] }[];
    });
    run(): Promise<{ address: string; port: number }>;
    close(): Promise<void>;
  }
}
