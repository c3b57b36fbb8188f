import { Page } from '@/components/page';

export function Component() {
  return <Page title="Outcome" heading="Outcome" />;
}
