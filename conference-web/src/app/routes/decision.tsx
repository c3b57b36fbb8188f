import { Page } from '@/components/page';

export function Component() {
  return <Page title="Decision" heading="Decision" />;
}
