import { Button } from '@radix-ui/themes';
import { useState } from 'react';
import type { Mentionable } from '@/components/editor/editor-props';
import { CheckField } from '@/components/field';
import { FormProblem } from '@/components/form-problem';
import { formatDate } from '@/lib/dates';
import { useHasKept, useKept } from '@/lib/use-kept';
import { useAnswerThread } from '../api/answer-thread';
import { useCreateRemark } from '../api/create-remark';
import type { Thread } from '../api/list-threads';
import { Composer } from './composer';
import { RemarkItem } from './remark';
import styles from './margin.module.css';

interface ThreadViewProps {
  caseId: string;
  thread: Thread;
  /** 'On a step that is no longer in the plan.' */
  lostAnchor: string | null;
  people: Mentionable[];
  mayWrite: boolean;
  mayTidy: boolean;
  isPresenter: boolean;
}

/** A remark or a question, with what was said to it. */
export function ThreadView({ caseId, thread, lostAnchor, people, mayWrite, mayTidy, isPresenter }: ThreadViewProps) {
  const name = `reply:${thread.id}`;
  const [isOpen, setOpen] = useState(useHasKept(`remark:${name}`));
  const [replyToId, setReplyToId] = useState<string | null>(null);
  const { remarks } = thread;
  const isQuestion = thread.kind === 'question';
  const isAskedByMe = remarks[0]?.isMine ?? false;
  const reply = (id: string) => {
    setReplyToId(id);
    setOpen(true);
  };
  return (
    <article className={styles.thread} data-question={isQuestion || undefined} data-open={(isQuestion && thread.answeredAt === null) || undefined}>
      {lostAnchor && <p className="label-text">{lostAnchor}</p>}
      {isQuestion && (
        <p className={styles.question}>
          Question to the presenter: {thread.answeredAt === null ? 'open' : `answered ${formatDate(thread.answeredAt)}`}
        </p>
      )}
      <ol className={styles.remarks}>
        {remarks.map((remark, index) => (
          <RemarkItem
            key={remark.id}
            caseId={caseId}
            remark={remark}
            repliesTo={nameAnswered(thread, index)}
            people={people}
            mayWrite={mayWrite}
            mayTidy={mayTidy}
            onReply={() => reply(remark.id)}
          />
        ))}
      </ol>
      {isOpen && <Reply {...{ caseId, thread, name, people, replyToId }} mayAnswer={isPresenter} onClose={() => setOpen(false)} />}
      {isQuestion && mayWrite && (isPresenter || isAskedByMe) && !isOpen && <Answered caseId={caseId} thread={thread} />}
    </article>
  );
}

/** Whom a reply is to, unless it is to the remark right above it. */
function nameAnswered({ remarks }: Thread, index: number): string | null {
  const { replyToId } = remarks[index]!;
  if (!replyToId || remarks[index - 1]?.id === replyToId) return null;
  return remarks.find(({ id }) => id === replyToId)?.author.name ?? null;
}

interface ReplyProps {
  caseId: string;
  thread: Thread;
  name: string;
  people: Mentionable[];
  replyToId: string | null;
  mayAnswer: boolean;
  onClose: () => void;
}

function Reply({ caseId, thread, name, people, replyToId, mayAnswer, onClose }: ReplyProps) {
  const create = useCreateRemark(caseId, thread.id);
  const asksForAnswer = mayAnswer && thread.kind === 'question' && thread.answeredAt === null;
  const answers = useKept(`answers:${thread.id}`, true);
  const close = () => {
    answers.forget(true);
    onClose();
  };
  return (
    <Composer
      name={name}
      label="Reply"
      sendWord={asksForAnswer && answers.value ? 'Post answer' : 'Post reply'}
      people={people}
      onSend={(content) =>
        create.mutateAsync({
          content: { ...content },
          ...(replyToId ? { replyToId } : {}),
          ...(asksForAnswer ? { answers: answers.value } : {}),
        })
      }
      onClose={close}
    >
      {asksForAnswer && (
        <CheckField label="This answers the question" checked={answers.value} onChange={(event) => answers.set(event.target.checked)} />
      )}
    </Composer>
  );
}

/** For the presenter and for who asked. */
function Answered({ caseId, thread }: { caseId: string; thread: Thread }) {
  const answer = useAnswerThread(caseId, thread.id);
  const isOpen = thread.answeredAt === null;
  return (
    <>
      <FormProblem error={answer.error} />
      <Button type="button" size="1" variant="soft" color="gray" className={styles.answered} loading={answer.isPending} onClick={() => answer.mutate(isOpen)}>
        {isOpen ? 'Mark as answered' : 'Open question again'}
      </Button>
    </>
  );
}
