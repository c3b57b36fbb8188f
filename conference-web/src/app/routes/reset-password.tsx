import { Page } from '@/components/page';

export function Component() {
  return <Page title="New password" heading="New password" />;
}
