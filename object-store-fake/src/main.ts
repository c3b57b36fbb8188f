import { S3Error } from './errors.js';
import { startObjectStoreFake } from './object-store-fake.js';
import { readSettings } from './settings.js';

try {
  const settings = readSettings(process.env);
  const server = await startObjectStoreFake(settings).catch((error: unknown) => {
    throw explain(error, settings.port);
  });
  const end = (): void => {
    server.close().then(
      () => process.exit(0),
      (error: unknown) => {
        console.error('object-store-fake:', error);
        process.exit(1);
      },
    );
  };
  process.once('SIGTERM', end);
  process.once('SIGINT', end);
  console.log(`object-store-fake is ready: 127.0.0.1:${server.port}`);
} catch (error) {
  console.error(`object-store-fake: ${error instanceof Error ? error.message : String(error)}`);
  process.exit(1);
}

function explain(error: unknown, port: number): unknown {
  if (error instanceof S3Error && error.code === 'InvalidBucketName') {
    return new Error('KERFSIDE_S3_BUCKET must be a valid bucket name: 3 to 63 lower-case letters, digits, dots, hyphens');
  }
  if ((error as NodeJS.ErrnoException).code !== 'EADDRINUSE') return error;
  return new Error(`port ${port} is taken; set KERFSIDE_OBJECT_STORE_PORT to a free one`);
}
