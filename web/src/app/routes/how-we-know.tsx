import { PageHead } from '../../components/page-head';

export function HowWeKnow() {
  return <PageHead title="How we know" />;
}
