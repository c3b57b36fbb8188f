import { Page } from '@/components/page';

export function Component() {
  return <Page title="Invitation" heading="Invitation" />;
}
