import { PageHead } from '../../components/page-head';

export function Styleguide() {
  return <PageHead title="Style guide" />;
}
