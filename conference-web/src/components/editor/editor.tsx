import { lazy, Suspense } from 'react';
import { TextSkeleton } from '@/components/page-states';
import type { EditorProps } from './editor-props';
import styles from './editor.module.css';

const RichTextEditor = lazy(() => import('./rich-text-editor'));

/** Where people write remarks. The editor's own code comes when the first one opens. */
export function Editor(props: EditorProps) {
  return (
    <Suspense
      fallback={
        <div className={styles.frame}>
          <TextSkeleton lines={2} />
        </div>
      }
    >
      <RichTextEditor {...props} />
    </Suspense>
  );
}
