import { Page } from '@/components/page';

export function Component() {
  return <Page title="Run meeting" heading="Run meeting" />;
}
