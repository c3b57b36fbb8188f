import { ChevronDownIcon, ChevronUpIcon } from '@radix-ui/react-icons';
import { Button, IconButton } from '@radix-ui/themes';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Link } from 'react-router-dom';
import { paths } from '@/app/paths';
import { Confirm } from '@/components/confirm';
import { FormProblem } from '@/components/form-problem';
import { Loaded, TableSkeleton } from '@/components/page-states';
import { moved } from '@/components/running-order/running-order-scale';
import { SaveState, type SavingState } from '@/components/save-state';
import { fieldMessages } from '@/lib/api/field-messages';
import { type CaseImage, imagesQuery } from '../api/list-images';
import { useOrderImages, useRemoveImage, useUpdateImage } from '../api/update-image';
import { imageWords } from '../image-words';
import type { ImageFields } from '../upload/upload-queue';
import { ImageFieldsForm } from './image-fields';
import styles from './images.module.css';

/** The pictures of a case, to describe, order and remove. */
export function ImageList({ caseId }: { caseId: string }) {
  const query = useQuery(imagesQuery(caseId));
  const { mutate, error, isPending } = useOrderImages(caseId);
  return (
    <Loaded query={query} skeleton={<TableSkeleton rows={2} columns={3} />}>
      {({ items }) =>
        items.length === 0 ? (
          <p className="label-text">No picture is in the case yet.</p>
        ) : (
          <>
            <FormProblem error={error} />
            <ol className={styles.rows} aria-label="Pictures of the case">
              {items.map((image, index) => (
                <ImageRow
                  key={image.id}
                  {...{ caseId, image, index }}
                  count={items.length}
                  onMove={(to) => {
                    if (!isPending && to >= 0 && to < items.length) mutate(moved(items, index, to));
                  }}
                />
              ))}
            </ol>
          </>
        )
      }
    </Loaded>
  );
}

interface ImageRowProps {
  caseId: string;
  image: CaseImage;
  index: number;
  count: number;
  onMove: (to: number) => void;
}

function ImageRow({ caseId, image, index, count, onMove }: ImageRowProps) {
  const { mutateAsync: remove } = useRemoveImage(caseId);
  const words = `picture ${index + 1}, ${imageWords(image)}`;
  return (
    <li className={styles.row}>
      <div className={styles.thumb}>
        <Link to={paths.caseImage(caseId, image.id)} aria-label={`Open ${words}`}>
          <img src={image.addresses.thumb} alt="" loading="lazy" />
        </Link>
      </div>
      <DescribeImage caseId={caseId} image={image} number={index + 1} />
      <div className={styles.buttons}>
        <IconButton type="button" variant="soft" color="gray" highContrast aria-label={`Move ${words} up`} aria-disabled={index === 0} onClick={() => onMove(index - 1)}>
          <ChevronUpIcon />
        </IconButton>
        <IconButton
          type="button"
          variant="soft"
          color="gray"
          highContrast
          aria-label={`Move ${words} down`}
          aria-disabled={index === count - 1}
          onClick={() => onMove(index + 1)}
        >
          <ChevronDownIcon />
        </IconButton>
        <Confirm
          title="Remove this picture"
          confirmWord="Remove picture"
          tone="grave"
          onConfirm={() => remove(image.id)}
          trigger={
            <Button type="button" variant="soft" color="gray" highContrast aria-label={`Remove ${words}`}>
              Remove
            </Button>
          }
        >
          Its files are deleted at once. Remarks on it stay with the case.
        </Confirm>
      </div>
    </li>
  );
}

/** Saved as soon as a field is left; what was refused stays typed. */
function DescribeImage({ caseId, image, number }: { caseId: string; image: CaseImage; number: number }) {
  const { mutateAsync, error } = useUpdateImage(caseId);
  const [typed, setTyped] = useState<Partial<ImageFields>>({});
  const [saving, setSaving] = useState<SavingState | null>(null);
  const value = { projection: image.projection, interval: image.interval, caption: image.caption, ...typed };
  const save = async (fields: Partial<ImageFields>) => {
    const isChanged = Object.entries(fields).some(([name, text]) => image[name as keyof ImageFields] !== text);
    if (!isChanged) return setTyped((all) => without(all, fields));
    setSaving({ kind: 'saving' });
    try {
      await mutateAsync({ id: image.id, ...fields });
      setSaving({ kind: 'saved', at: new Date() });
      setTyped((all) => without(all, fields));
    } catch {
      setSaving({ kind: 'failed', retrying: false });
    }
  };
  return (
    <div className={styles.body}>
      <p className={styles.name}>
        <strong>Picture {number}</strong>{' '}
        <span className="label-text">
          {image.width} × {image.height}
        </span>{' '}
        {saving && <SaveState state={saving} />}
      </p>
      <FormProblem error={saving?.kind === 'failed' ? error : null} shown={['projection', 'interval', 'caption']} />
      <ImageFieldsForm
        value={value}
        errors={saving?.kind === 'failed' ? fieldMessages(error) : {}}
        onChange={(fields) => setTyped((all) => ({ ...all, ...fields }))}
        onRest={(fields) => void save(fields)}
      />
    </div>
  );
}

/** What was typed without what is saved now; text typed since stays. */
function without(typed: Partial<ImageFields>, saved: Partial<ImageFields>): Partial<ImageFields> {
  return Object.fromEntries(Object.entries(typed).filter(([name, text]) => saved[name as keyof ImageFields] !== text));
}
