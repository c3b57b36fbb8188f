import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useState, useSyncExternalStore } from 'react';
import { useMe } from '@/lib/auth/session';
import { sendImageOf } from '../api/send-image';
import { imagesChanged } from '../api/update-image';
import { UploadQueue } from './upload-queue';

// outside the page, so that uploads go on while the person looks at another one
const queues = new Map<string, UploadQueue>();

const isBusy = (queue: UploadQueue) => queue.getSnapshot().some(({ state }) => ['waiting', 'sending', 'reading'].includes(state.kind));

/** This person's uploads to a case. Closing the browser while some are under way asks first. */
export function useUploadQueue(caseId: string) {
  const me = useMe();
  const client = useQueryClient();
  const [queue] = useState(() => {
    const key = `${me.id} ${caseId}`;
    const found = queues.get(key) ?? new UploadQueue(sendImageOf(caseId), () => void imagesChanged(client, caseId));
    queues.set(key, found);
    return found;
  });
  const uploads = useSyncExternalStore(queue.subscribe, queue.getSnapshot);
  useEffect(() => {
    const ask = (event: BeforeUnloadEvent) => {
      if (isBusy(queue)) event.preventDefault();
    };
    addEventListener('beforeunload', ask);
    return () => removeEventListener('beforeunload', ask);
  }, [queue]);
  return { queue, uploads };
}
