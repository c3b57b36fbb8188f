import { Button, Flex } from '@radix-ui/themes';
import { type DragEvent, useRef, useState } from 'react';
import { Caution } from '@/components/caution';
import { counted } from '@/lib/units';
import { useUploadQueue } from '../upload/use-upload-queue';
import type { Upload, UploadQueue } from '../upload/upload-queue';
import { ImageList } from './image-list';
import { UploadRow } from './upload-row';
import styles from './images.module.css';

const ACCEPTED = 'image/jpeg,image/png,image/webp,image/tiff,.tif,.tiff,.dcm,.dicom,application/dicom';

/** Puts pictures into a case, and keeps those that are there in order. */
export function ImageUpload({ caseId }: { caseId: string }) {
  const { queue, uploads } = useUploadQueue(caseId);
  return (
    <div className={styles.upload}>
      <Caution>
        Take names, dates, record numbers and faces out of the pictures first. The server drops what is hidden in a file (EXIF, DICOM header), but it
        can not see text that is burned into the picture. File names are not sent.
      </Caution>
      <DropZone onFiles={(files) => queue.add(files)} />
      {uploads.length > 0 && (
        <>
          <ul className={styles.rows} aria-label="Pictures to upload">
            {uploads.map((upload) => (
              <UploadRow key={upload.id} upload={upload} queue={queue} />
            ))}
          </ul>
          <QueueButtons {...{ queue, uploads }} />
        </>
      )}
      <ImageList caseId={caseId} />
    </div>
  );
}

function DropZone({ onFiles }: { onFiles: (files: File[]) => void }) {
  const input = useRef<HTMLInputElement>(null);
  const [isOver, setOver] = useState(false);
  const drop = (event: DragEvent) => {
    event.preventDefault();
    setOver(false);
    onFiles([...event.dataTransfer.files]);
  };
  return (
    <div
      className={styles.drop}
      data-over={isOver || undefined}
      onDragOver={(event) => {
        event.preventDefault();
        setOver(true);
      }}
      onDragLeave={() => setOver(false)}
      onDrop={drop}
    >
      <Button type="button" variant="soft" onClick={() => input.current?.click()}>
        Choose pictures
      </Button>
      <span className="label-text">or drop them here. JPEG, PNG, WebP, TIFF, or DICOM with one frame.</span>
      <input
        ref={input}
        type="file"
        multiple
        accept={ACCEPTED}
        aria-label="Pictures"
        tabIndex={-1}
        className="visually-hidden"
        onChange={({ target }) => {
          onFiles([...(target.files ?? [])]);
          // the same file can be chosen again
          target.value = '';
        }}
      />
    </div>
  );
}

function QueueButtons({ queue, uploads }: { queue: UploadQueue; uploads: readonly Upload[] }) {
  const count = (...kinds: Upload['state']['kind'][]) => uploads.filter(({ state }) => kinds.includes(state.kind)).length;
  const chosen = count('chosen');
  const moving = count('waiting', 'sending', 'reading');
  const done = count('done');
  const refused = count('refused');
  const words = [
    `${done} of ${uploads.length} uploaded`,
    ...(moving > 0 ? [`${moving} under way`] : []),
    ...(refused > 0 ? [`${refused} refused`] : []),
  ];
  return (
    <Flex gap="3" align="center" wrap="wrap" mb="5">
      {chosen > 0 && <Button onClick={() => queue.start()}>Upload {counted(chosen, 'picture')}</Button>}
      {moving > 0 && (
        <Button variant="soft" color="gray" highContrast onClick={() => queue.cancelAll()}>
          Cancel all
        </Button>
      )}
      {done > 0 && (
        <Button
          variant="soft"
          color="gray"
          highContrast
          onClick={() => uploads.filter(({ state }) => state.kind === 'done').forEach(({ id }) => queue.remove(id))}
        >
          Clear the uploaded
        </Button>
      )}
      <span role="status" className="label-text">
        {words.join(', ')}.
      </span>
    </Flex>
  );
}
