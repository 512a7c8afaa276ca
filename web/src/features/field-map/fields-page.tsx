import { PageHead } from '../../components/page-head';

export function FieldsPage() {
  return <PageHead title="Fields" />;
}
