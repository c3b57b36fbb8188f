import { Page } from '@/components/page';

export function Component() {
  return <Page title="Forgotten password" heading="Forgotten password" />;
}
