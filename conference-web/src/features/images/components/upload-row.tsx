import { Button } from '@radix-ui/themes';
import { fileSize } from '@/lib/units';
import type { Upload, UploadQueue, UploadState } from '../upload/upload-queue';
import { ImageFieldsForm } from './image-fields';
import styles from './images.module.css';

export function UploadRow({ upload, queue }: { upload: Upload; queue: UploadQueue }) {
  const { id, file, preview, fields, state } = upload;
  const errors = state.kind === 'refused' ? state.problem.byField : {};
  const isLocked = !['chosen', 'refused', 'cancelled'].includes(state.kind);
  return (
    <li className={styles.row}>
      <div className={styles.thumb}>
        {preview ? (
          <a href={preview} target="_blank" rel="noreferrer" aria-label={`Look at ${file.name} in full`}>
            <img src={preview} alt="" />
          </a>
        ) : (
          <span className="label-text">Seen after the upload</span>
        )}
      </div>
      <div className={styles.body}>
        <p className={styles.name}>
          <strong>{file.name}</strong> <span className="label-text">{fileSize(file.size)}</span>
        </p>
        <Progress state={state} name={file.name} />
        {state.kind !== 'done' && <ImageFieldsForm value={fields} errors={errors} disabled={isLocked} onChange={(changed) => queue.describe(id, changed)} />}
      </div>
      <RowButtons {...{ upload, queue }} />
    </li>
  );
}

function RowButtons({ upload: { id, file, state }, queue }: { upload: Upload; queue: UploadQueue }) {
  const isMoving = ['waiting', 'sending', 'reading'].includes(state.kind);
  return (
    <div className={styles.buttons}>
      {isMoving && (
        <Button variant="soft" color="gray" highContrast onClick={() => queue.cancel(id)} aria-label={`Cancel: ${file.name}`}>
          Cancel
        </Button>
      )}
      {(state.kind === 'refused' || state.kind === 'cancelled') && (
        <Button variant="soft" onClick={() => queue.retry(id)} aria-label={`Try again: ${file.name}`}>
          Try again
        </Button>
      )}
      {!isMoving && (
        <Button variant="soft" color="gray" highContrast onClick={() => queue.remove(id)} aria-label={`${state.kind === 'done' ? 'Clear' : 'Leave out'}: ${file.name}`}>
          {state.kind === 'done' ? 'Clear' : 'Leave out'}
        </Button>
      )}
    </div>
  );
}

function Progress({ state, name }: { state: UploadState; name: string }) {
  switch (state.kind) {
    case 'chosen':
      return null;
    case 'waiting':
      return <p className="label-text">Waiting for its turn</p>;
    case 'sending': {
      const percent = state.total > 0 ? Math.floor((state.sent / state.total) * 100) : 0;
      return (
        <p className={styles.progress}>
          <progress max={100} value={percent} aria-label={`Upload of ${name}`} />
          {percent}
          {'\u00a0'}%
        </p>
      );
    }
    case 'reading':
      return (
        <p className={styles.progress}>
          <progress aria-label={`The server reads ${name}`} /> The server reads the picture
        </p>
      );
    case 'done':
      return <p className="label-text">Uploaded</p>;
    case 'cancelled':
      return <p className="label-text">Cancelled</p>;
    case 'refused':
      return (
        <p className={styles.refused} role="alert">
          <strong>{name}:</strong> {state.problem.title}. {state.problem.errors.length === 0 && state.problem.detail}
        </p>
      );
  }
}
