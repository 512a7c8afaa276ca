import { PageHead } from '../../components/page-head';

export function Help() {
  return <PageHead title="Help" />;
}
