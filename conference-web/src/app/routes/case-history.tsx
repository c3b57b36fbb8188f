import { Page } from '@/components/page';

export function Component() {
  return <Page title="Case history" heading="History" />;
}
