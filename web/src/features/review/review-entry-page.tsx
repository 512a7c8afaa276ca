import { Skeleton } from '@mantine/core';
import { useQuery } from '@tanstack/react-query';
import { useEffect, useState } from 'react';
import { Wordmark } from '../../components/wordmark';
import { ApiProblem } from '../../lib/api';
import { enterReview, reviewPageQuery } from '../../queries/reviews';
import { ReviewPageView } from './farmer/review-page';
import classes from './farmer/farmer.module.css';

/** The token of the link, read once before it leaves the address. */
function tokenOf(): string | null {
  const token = window.location.hash.slice(1);
  return token.length > 0 ? token : null;
}

type Entry = 'entering' | 'inside' | { error: unknown };

/** What went wrong, in words for someone who only followed a link. */
function sorry(error: unknown): { title: string; text: string } {
  if (error instanceof ApiProblem && error.code === 'offline') {
    return { title: 'No connection', text: 'Try again when your phone is online.' };
  }
  if (error instanceof ApiProblem && (error.status === 410 || error.status === 404)) {
    return { title: 'This link is closed', text: error.detail };
  }
  if (error instanceof ApiProblem && (error.status === 401 || error.status === 403)) {
    return {
      title: 'Please open the link again',
      text: 'This page needs the whole link from your message. If it was some time ago, the link may have expired: ask your advisor for a new one.',
    };
  }
  return {
    title: 'The page could not be shown',
    text: error instanceof ApiProblem ? error.detail : 'Reload the page in a moment.',
  };
}

/** Lets the holder of a link in, takes the token out of the address, and shows the plan. */
export function ReviewEntryPage() {
  const [token] = useState(tokenOf);
  const [entry, setEntry] = useState<Entry>(token ? 'entering' : 'inside');
  const page = useQuery({ ...reviewPageQuery, enabled: entry === 'inside' });

  useEffect(() => {
    if (!token) return undefined;
    let current = true;
    window.history.replaceState(null, '', window.location.pathname);
    enterReview({ token })
      .then(() => current && setEntry('inside'))
      .catch((error: unknown) => current && setEntry({ error }));
    return () => {
      current = false;
    };
  }, [token]);

  const error = typeof entry === 'object' ? entry.error : page.error;
  if (error) {
    const { title, text } = sorry(error);
    return (
      <main className={classes.page}>
        <Wordmark />
        <div className={classes.closed} role="alert">
          <h1>{title}</h1>
          <p>{text}</p>
        </div>
      </main>
    );
  }
  if (!page.data) {
    return (
      <main className={classes.page} aria-busy>
        <Wordmark />
        <Skeleton height={36} mt="xl" />
        <Skeleton height={240} mt="md" />
      </main>
    );
  }
  return <ReviewPageView page={page.data} />;
}
