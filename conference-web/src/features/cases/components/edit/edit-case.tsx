import { CONTENT_SECTIONS } from '@kerfside/calc/vocabulary/case-content.js';
import { SECTIONS } from '@kerfside/calc/vocabulary/case.js';
import { Button } from '@radix-ui/themes';
import { useQuery } from '@tanstack/react-query';
import { useEffect, useMemo } from 'react';
import { Link, useLocation } from 'react-router-dom';
import { paths } from '@/app/paths';
import { SaveState } from '@/components/save-state';
import type { Schemas } from '@/lib/api/types';
import { identifiersQuery } from '../../api/get-identifiers';
import { readinessQuery } from '../../api/get-readiness';
import { useCaseDraft } from '../../draft/use-case-draft';
import { findingsByPlace, FindingsContext } from '../../form/findings-context';
import { PostDialog } from '../post-dialog';
import { ConflictBox } from './conflict-box';
import { DraftNotices } from './draft-notices';
import { EditImages } from './edit-images';
import { goToPlace, sectionInAddress } from './go-to-place';
import { ReadinessPanel } from './readiness-panel';
import { EditSection, SectionForm } from './section-forms';
import { SectionNav } from './section-nav';
import styles from './edit-case.module.css';

const isContent = (section: string): section is (typeof CONTENT_SECTIONS)[number] => (CONTENT_SECTIONS as readonly string[]).includes(section);

/** A case as one long form, saved as it is typed. */
export function EditCase({ found }: { found: Schemas['CaseDto'] }) {
  const { draft, state } = useCaseDraft(found);
  const readiness = useQuery(readinessQuery(found.id));
  const identifiers = useQuery(identifiersQuery(found.id));
  const findings = useMemo(() => identifiers.data?.items ?? [], [identifiers.data]);
  const byPlace = useMemo(() => findingsByPlace(findings), [findings]);
  const { content } = state;
  const asked = sectionInAddress(useLocation().hash);
  useEffect(() => {
    if (asked) goToPlace(asked);
  }, [asked]);
  const versionToPost = async () => ((await draft.saveNow()) ? draft.getState().version : null);
  return (
    <FindingsContext value={byPlace}>
      <div className={styles.bar}>
        <SaveState state={state.saving} />
        <span className={styles.actions}>
          <Button asChild variant="soft" color="gray">
            <Link to={paths.case(found.id)}>Sheet</Link>
          </Button>
          {found.actions.post && (
            <PostDialog caseId={found.id} trigger={<Button>Post case</Button>} versionToPost={versionToPost} onGoTo={(section) => goToPlace(section)} />
          )}
        </span>
      </div>
      <DraftNotices state={state} returnRemark={found.returnRemark} />
      <div className={styles.columns}>
        <SectionNav items={readiness.data?.items ?? []} />
        <ReadinessPanel readiness={readiness} identifiers={identifiers} content={content} />
        <div className={styles.form}>
          {SECTIONS.map((section) => (
            <EditSection key={section} section={section}>
              {isContent(section) ? (
                <>
                  <ConflictBox section={section} state={state} onSettle={draft.settleConflict} />
                  <SectionForm
                    section={section}
                    draft={draft}
                    value={content[section]}
                    refusals={state.refusals}
                    disabled={section === 'options' && !found.actions.editOptions}
                    side={content.heading.side ?? null}
                    isHip={content.heading.joint !== 'knee'}
                    parts={section === 'plan' ? content.implants.parts : undefined}
                  />
                </>
              ) : (
                <EditImages caseId={found.id} />
              )}
            </EditSection>
          ))}
        </div>
      </div>
    </FindingsContext>
  );
}
