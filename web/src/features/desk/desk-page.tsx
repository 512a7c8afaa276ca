import { PageHead } from '../../components/page-head';

export function DeskPage() {
  return <PageHead title="Desk" />;
}
