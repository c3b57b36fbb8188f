export interface FakeServer {
  readonly url: string;
  readonly port: number;
  readonly logFile: string;
  readonly pid: number | null;
  start(): Promise<void>;
  stop(): Promise<void>;
}

export interface MailServer extends FakeServer {
  readonly smtpUrl: string;
}

export interface ObjectStoreOptions {
  dataDir: string;
  port: number;
  /** Made when it is not there. */
  bucket?: string;
  accessKeyId?: string;
  secretAccessKey?: string;
  region?: string;
  logFile?: string;
}

export interface MailServerOptions {
  dataDir: string;
  smtpPort: number;
  port: number;
  logFile?: string;
}

export function createObjectStore(options: ObjectStoreOptions): FakeServer;
export function createMailServer(options: MailServerOptions): MailServer;
export function startObjectStore(options: ObjectStoreOptions): Promise<FakeServer>;
export function startMailServer(options: MailServerOptions): Promise<MailServer>;
