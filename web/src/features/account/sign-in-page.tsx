import { SignIn } from '@furrowlight/shared/contract/session';
import { Anchor, Button, PasswordInput, Stack, Text, TextInput, Title } from '@mantine/core';
import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useEffect, useState, type FormEvent } from 'react';
import { Navigate, useNavigate, useSearchParams } from 'react-router-dom';
import { ErrorPanel } from '../../components/error-panel';
import { FurrowArt } from '../../components/furrow-art';
import { Wordmark } from '../../components/wordmark';
import { ApiProblem } from '../../lib/api';
import { fieldMessages } from '../../lib/field-messages';
import { configQuery } from '../../queries/config';
import { sessionQuery, signIn } from '../../queries/session';
import classes from './sign-in-page.module.css';

/** Only places of this program may follow a sign-in. */
function safeNext(next: string | null): string {
  return next && /^\/(?![/\\])/.test(next) ? next : '/';
}

export function SignInPage() {
  const client = useQueryClient();
  const navigate = useNavigate();
  const [search] = useSearchParams();
  const session = useQuery(sessionQuery);
  const config = useQuery(configQuery);
  const enter = useMutation(signIn(client));
  const [email, setEmail] = useState('');
  const [password, setPassword] = useState('');
  const [messages, setMessages] = useState<Record<string, string>>({});
  const next = safeNext(search.get('next'));

  useEffect(() => {
    document.title = 'Sign in · Furrowlight';
  }, []);
  if (session.data) return <Navigate to={next} replace />;

  const go = async (credentials: SignIn) => {
    const found = fieldMessages(SignIn, credentials);
    setMessages(found);
    if (Object.keys(found).length > 0) return;
    try {
      await enter.mutateAsync(credentials);
      await navigate(next, { replace: true });
    } catch (error) {
      if (error instanceof ApiProblem) setMessages(error.fieldErrors);
    }
  };
  const onSubmit = (event: FormEvent) => {
    event.preventDefault();
    void go({ email: email.trim(), password });
  };

  return (
    <div className={classes.page}>
      <div className={classes.picture}>
        <FurrowArt />
        <p className={classes.say}>How much light does the crop keep?</p>
      </div>
      <main className={classes.door}>
        <Wordmark size={34} />
        <form onSubmit={onSubmit} noValidate className={classes.form}>
          <Title order={1}>Sign in</Title>
          {search.has('next') && (
            <Text c="dimmed" size="sm">
              Sign in to go on where you were. Unsaved drafts wait on this device.
            </Text>
          )}
          {enter.isError && <ErrorPanel error={enter.error} title="You are not signed in" />}
          <TextInput
            label="E-mail"
            type="email"
            autoComplete="username"
            size="md"
            value={email}
            onChange={(event) => setEmail(event.currentTarget.value)}
            error={messages.email}
          />
          <PasswordInput
            label="Password"
            autoComplete="current-password"
            size="md"
            value={password}
            onChange={(event) => setPassword(event.currentTarget.value)}
            error={messages.password}
            visibilityToggleButtonProps={{ 'aria-label': 'Show the password' }}
          />
          <Button type="submit" size="md" loading={enter.isPending}>
            Sign in
          </Button>
        </form>
        {config.data && config.data.demoAccounts.length > 0 && (
          <section className={classes.demo} aria-labelledby="demo-title">
            <Title order={2} size="h4" id="demo-title">
              Demo cooperative
            </Title>
            <Text size="sm" c="dimmed">
              Made-up people and farms. Enter as:
            </Text>
            <Stack gap={0} mt="xs">
              {config.data.demoAccounts.map((account) => (
                <Anchor
                  key={account.email}
                  component="button"
                  type="button"
                  className={classes.account}
                  onClick={() => void go({ email: account.email, password: account.password })}
                >
                  <span>{account.role}</span>
                  <span className={classes.mail}>{account.email}</span>
                </Anchor>
              ))}
            </Stack>
          </section>
        )}
      </main>
    </div>
  );
}
