import { useEffect, useState } from 'react';
import { Navigate, Outlet, useLocation } from 'react-router-dom';
import { ErrorState } from '../components/error-state';
import { LoadingPage } from '../components/loading';
import { PageShell } from '../components/page-shell/page-shell';
import { chooseLanguage } from '../i18n/i18n';
import { request } from '../lib/api-client';
import { asProblem, type ProblemError } from '../lib/problem';
import { useSessionState } from '../lib/session';
import { NAVIGATION } from './navigation';
import { paths } from './paths';

/** The part of the product behind the sign-in: finds out who is signed in, or sends to the sign-in page with the way back. */
export function SignedIn() {
  const { session, begin, end } = useSessionState();
  const location = useLocation();
  const [problem, setProblem] = useState<ProblemError | null>(null);
  const [attempt, setAttempt] = useState(0);

  useEffect(() => {
    if (session !== undefined) return;
    const controller = new AbortController();
    request('identity.session', { signal: controller.signal }).then(
      async (found) => {
        await chooseLanguage(found.person.language);
        begin(found);
      },
      (error: unknown) => {
        if (controller.signal.aborted) return;
        const refusal = asProblem(error);
        if (refusal.status === 401) end();
        else setProblem(refusal);
      },
    );
    return () => controller.abort();
  }, [session, begin, end, attempt]);

  if (problem && !session) {
    return (
      <ErrorState
        problem={problem}
        onRetry={() => {
          setProblem(null);
          setAttempt((count) => count + 1);
        }}
      />
    );
  }
  if (session === undefined) return <LoadingPage />;
  if (session === null) {
    const back = location.pathname + location.search;
    const search = back === paths.home ? '' : `?return=${encodeURIComponent(back)}`;
    return <Navigate to={`${paths.signIn}${search}`} replace />;
  }
  return (
    <PageShell
      navigation={NAVIGATION[session.hat]}
      homePath={paths.home}
      contentLanguage={session.hat === 'participant' ? undefined : 'en'}
    >
      <Outlet />
    </PageShell>
  );
}
