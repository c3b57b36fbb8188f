import { ImageUpload } from '@/features/images/components/image-upload';

/** The images of a case while it is written: put in, described, ordered, taken out. */
export const EditImages = ({ caseId }: { caseId: string }) => <ImageUpload caseId={caseId} />;
