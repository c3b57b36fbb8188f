import type { RichText as RichTextContent } from '@kerfside/calc/vocabulary/discussions.js';
import { DISCIPLINE_WORDS } from '@kerfside/calc/vocabulary/people.js';
import { useState } from 'react';
import { Confirm } from '@/components/confirm';
import type { Mentionable } from '@/components/editor/editor-props';
import { RichText } from '@/components/editor/rich-text';
import { asProblem } from '@/lib/api/problem';
import { formatDateTime } from '@/lib/dates';
import { useHasKept } from '@/lib/use-kept';
import { useEditRemark } from '../api/edit-remark';
import type { Remark } from '../api/list-threads';
import { useRemoveRemark } from '../api/remove-remark';
import { useSeen } from '../reading';
import { Composer } from './composer';
import { RemarkHistory } from './remark-history';
import styles from './margin.module.css';

interface RemarkItemProps {
  caseId: string;
  remark: Remark;
  /** Whom it answers, where that is not plain from its place. */
  repliesTo: string | null;
  people: Mentionable[];
  mayWrite: boolean;
  /** Chair and coordinator may take away what should not stand there. */
  mayTidy: boolean;
  onReply: () => void;
}

/** One remark: who, when, what; with what its author may do to it. */
export function RemarkItem({ caseId, remark, repliesTo, people, mayWrite, mayTidy, onReply }: RemarkItemProps) {
  const element = useSeen(caseId, remark.id, remark.isNew);
  const [isEditing, setEditing] = useState(useHasKept(`remark:edit:${remark.id}`));
  const { author, createdAt, deletedAt } = remark;
  if (deletedAt !== null)
    return (
      <li ref={element} className={styles.gone}>
        A remark by {author.name} was deleted, <time dateTime={deletedAt}>{formatDateTime(deletedAt)}</time>
      </li>
    );
  return (
    <li ref={element} className={styles.remark} data-new={remark.isNew || undefined}>
      <div className={styles.who}>
        <strong>{author.name}</strong>
        {remark.isNew && <span className={styles.fresh}>New</span>}
        <span className={styles.from}>
          {DISCIPLINE_WORDS[author.discipline]}, {author.unit}
        </span>
        <span className={styles.from}>
          <time dateTime={createdAt}>{formatDateTime(createdAt)}</time>
          {repliesTo && <>, to {repliesTo}</>}
          {remark.editedAt !== null && (
            <>
              , <RemarkHistory remark={remark} />
            </>
          )}
        </span>
      </div>
      {isEditing ? (
        <EditRemark caseId={caseId} remark={remark} people={people} onClose={() => setEditing(false)} />
      ) : (
        <>
          <RichText content={remark.content} />
          {mayWrite && <Actions {...{ caseId, remark, mayTidy, onReply }} onEdit={() => setEditing(true)} />}
        </>
      )}
    </li>
  );
}

interface ActionsProps extends Pick<RemarkItemProps, 'caseId' | 'remark' | 'mayTidy' | 'onReply'> {
  onEdit: () => void;
}

function Actions({ caseId, remark, mayTidy, onReply, onEdit }: ActionsProps) {
  const remove = useRemoveRemark(caseId);
  return (
    <div className={styles.actions}>
      <button type="button" className={styles.word} onClick={onReply} aria-label={`Reply to ${remark.author.name}`}>
        Reply
      </button>
      {remark.isMine && (
        <button type="button" className={styles.word} onClick={onEdit}>
          Edit
        </button>
      )}
      {(remark.isMine || mayTidy) && (
        <Confirm
          title={remark.isMine ? 'Delete this remark' : `Delete the remark by ${remark.author.name}`}
          confirmWord="Delete remark"
          tone="grave"
          onConfirm={() => remove.mutateAsync(remark.id)}
          trigger={
            <button type="button" className={styles.word}>
              Delete
            </button>
          }
        >
          Its text is taken away for everyone, with its earlier texts. A mark stays that something was said here.
        </Confirm>
      )}
    </div>
  );
}

function EditRemark({ caseId, remark, people, onClose }: { caseId: string; remark: Remark; people: Mentionable[]; onClose: () => void }) {
  const edit = useEditRemark(caseId, remark.id);
  const [base, setBase] = useState(remark.version);
  const isStale = edit.error !== null && asProblem(edit.error).code === 'stale-version';
  const send = (content: RichTextContent) => {
    // after a refusal the newer text stands above this one, so sending again means it
    const baseVersion = isStale ? remark.version : base;
    setBase(baseVersion);
    return edit.mutateAsync({ baseVersion, content: { ...content } });
  };
  return (
    <>
      {isStale && (
        <div className={styles.theirs}>
          <p className="label-text">You saved this in another window meanwhile:</p>
          <RichText content={remark.content} />
        </div>
      )}
      <Composer
        name={`edit:${remark.id}`}
        label="Text of your remark"
        sendWord="Save text"
        people={people}
        initial={remark.content as RichTextContent | null}
        onSend={send}
        onClose={onClose}
      />
    </>
  );
}
