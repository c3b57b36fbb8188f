import { Page } from '@/components/page';

export function Component() {
  return <Page title="Edit case" heading="Edit case" />;
}
