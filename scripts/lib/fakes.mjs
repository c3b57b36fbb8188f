import { join } from 'node:path';
import { answers } from './http.mjs';
import { projectRoot } from './root.mjs';
import { createService } from './service.mjs';

/** The object store that speaks S3, not started yet: {url, start, stop, pid, …}. Needs its workspace built. */
export function createObjectStore({ dataDir, port, bucket, accessKeyId, secretAccessKey, region, logFile }) {
  const url = `http://127.0.0.1:${port}`;
  const service = nodeService({
    title: 'Object store',
    workspace: 'object-store-fake',
    logFile: logFile ?? join(dataDir, 'object-store.log'),
    env: {
      KERFSIDE_OBJECT_STORE_DATA: join(dataDir, 'objects'),
      KERFSIDE_OBJECT_STORE_PORT: String(port),
      ...(bucket && { KERFSIDE_S3_BUCKET: bucket }),
      ...(accessKeyId && { KERFSIDE_S3_ACCESS_KEY_ID: accessKeyId }),
      ...(secretAccessKey && { KERFSIDE_S3_SECRET_ACCESS_KEY: secretAccessKey }),
      ...(region && { KERFSIDE_S3_REGION: region }),
    },
    isReady: () => answers(url),
  });
  return Object.assign(service, { url, port });
}

/** The mail server that keeps what it gets, not started yet: `smtpUrl` takes mail, `url` shows it. */
export function createMailServer({ dataDir, smtpPort, port, logFile }) {
  const url = `http://127.0.0.1:${port}`;
  const service = nodeService({
    title: 'Mail server',
    workspace: 'mail-fake',
    logFile: logFile ?? join(dataDir, 'mail.log'),
    env: {
      KERFSIDE_MAIL_DATA: join(dataDir, 'mail'),
      KERFSIDE_SMTP_PORT: String(smtpPort),
      KERFSIDE_MAIL_PORT: String(port),
    },
    isReady: () => answers(`${url}/api/messages`, (status) => status === 200),
  });
  return Object.assign(service, { url, port, smtpUrl: `smtp://127.0.0.1:${smtpPort}` });
}

/** As createObjectStore, started and ready. */
export async function startObjectStore(options) {
  const store = createObjectStore(options);
  await store.start();
  return store;
}

/** As createMailServer, started and ready. */
export async function startMailServer(options) {
  const mail = createMailServer(options);
  await mail.start();
  return mail;
}

/** A workspace's built `dist/main.js` as a service. */
export function nodeService({ title, workspace, logFile, env, isReady, readyWithinMs }) {
  const root = projectRoot();
  return createService({
    title,
    logFile,
    isReady,
    readyWithinMs,
    command: () => ({
      file: process.execPath,
      args: [join(root, workspace, 'dist/main.js')],
      cwd: root,
      // Logs are files: no colours.
      env: { ...process.env, NO_COLOR: '1', ...env },
    }),
  });
}
