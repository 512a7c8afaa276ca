import { PageHead } from '../../components/page-head';

export function FieldRoute() {
  return <PageHead title="Field" />;
}
