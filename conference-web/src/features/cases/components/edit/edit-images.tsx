import type { Schemas } from '@/lib/api/types';
import { ImageStrip } from '../image-strip';

/** The images of a case while it is written. */
export function EditImages({ found }: { found: Schemas['CaseDto'] }) {
  return (
    <>
      {/* The upload and the list's editing come from features/images: <ImageUpload caseId={found.id} /> stands here. */}
      <ImageStrip caseId={found.id} images={found.images} />
    </>
  );
}
