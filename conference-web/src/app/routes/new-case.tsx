import { Page } from '@/components/page';

export function Component() {
  return <Page title="New case" heading="Begin a case" />;
}
