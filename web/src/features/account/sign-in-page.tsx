import { PageHead } from '../../components/page-head';

export function SignInPage() {
  return <PageHead title="Sign in" />;
}
