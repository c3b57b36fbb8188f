export interface MariaDBOptions {
  dataDir: string;
  port: number;
  user?: string;
  password: string;
  databases?: string[];
  durable?: boolean;
  logFile?: string;
}

export interface MariaDBServer {
  readonly url: string;
  readonly port: number;
  readonly user: string;
  readonly password: string;
  readonly logFile: string;
  readonly pid: number | null;
  urlOf(database: string): string;
  start(): Promise<void>;
  stop(): Promise<void>;
  onUnexpectedExit(listener: (end: { code: number | null; signal: string | null }) => void): void;
}

export function createMariaDB(options: MariaDBOptions): MariaDBServer;
export function startMariaDB(options: MariaDBOptions): Promise<MariaDBServer>;
