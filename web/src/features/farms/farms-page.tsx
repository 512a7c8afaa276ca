import { PageHead } from '../../components/page-head';

export function FarmsPage() {
  return <PageHead title="Farms" />;
}
