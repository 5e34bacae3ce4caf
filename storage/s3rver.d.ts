/** The part of the local S3 server's package that is used here; it brings no types of its own. */
declare module '@20minutes/s3rver' {
  interface LocalServerOptions {
    address: string;
    /** 0: any free one */
    port: number;
    silent: boolean;
    directory: string;
    allowMismatchedSignatures: boolean;
    vhostBuckets: boolean;
    configureBuckets: { name: string }[];
  }

  export interface Context {
    method: string;
    path: string;
    query: Record<string, string | string[] | undefined>;
    status: number;
  }

  export type Middleware = (context: Context, next: () => Promise<void>) => Promise<void>;

  export default class S3rver {
    constructor(options: LocalServerOptions);
    run(): Promise<{ address: string; port: number }>;
    close(): Promise<void>;
    httpServer?: import('node:http').Server;
    /** Koa's: called in order, before the package's own routes where put in front of them */
    middleware: Middleware[];
    on(event: 'error', listener: (error: Error) => void): this;
  }
}
