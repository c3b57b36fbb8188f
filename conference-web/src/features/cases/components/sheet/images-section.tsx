import type { Schemas } from '@/lib/api/types';
import { CasePicture, imageWords } from '../case-picture';
import { NotKnown } from './known';
import { SheetRow, SheetSection } from './sheet-row';

interface ImagesSectionProps {
  caseId: string;
  images: Schemas['ImageDto'][];
  /** Whoever looks for identifiers has to read what is burned in. */
  areLarge: boolean;
}

export function ImagesSection({ caseId, images, areLarge }: ImagesSectionProps) {
  return (
    <SheetSection
      section="images"
      rows={images.map((image) => (
        <SheetRow key={image.id} anchorKind="image" anchorRef={image.id} about={`image ${imageWords(image)}`}>
          <CasePicture caseId={caseId} image={image} isLarge={areLarge} />
        </SheetRow>
      ))}
    >
      {images.length === 0 && (
        <p>
          <NotKnown>There are no images.</NotKnown>
        </p>
      )}
    </SheetSection>
  );
}
