import type { Hat, SessionView } from '@quarterpoise/dto';
import { createContext, useCallback, useContext, useMemo, useState, type ReactNode } from 'react';
import { SWRConfig } from 'swr';
import { useNavigate } from 'react-router-dom';
import { rememberCsrfToken, request } from './api-client';
import { swrConfiguration } from './swr';

interface SessionState {
  /** undefined until asked, null when nobody is signed in. */
  session: SessionView | null | undefined;
  begin(session: SessionView): void;
  end(): void;
}

const SessionContext = createContext<SessionState | null>(null);

export function useSessionState(): SessionState {
  const state = useContext(SessionContext);
  if (!state) throw new Error('useSessionState needs a SessionProvider above it');
  return state;
}

/** Who is signed in. Only below the signed-in part of the router, where somebody always is. */
export function useSession(): SessionView {
  const { session } = useSessionState();
  if (!session) throw new Error('useSession is for screens behind the sign-in');
  return session;
}

export function useHat(): Hat {
  return useSession().hat;
}

/** Holds who is signed in; every read below goes through the one SWR configuration, which ends the session on a 401. */
export function SessionProvider({ children, initial }: { children: ReactNode; initial?: SessionView | null }) {
  const [session, setSession] = useState(initial);
  const begin = useCallback((next: SessionView) => {
    rememberCsrfToken(next.csrfToken);
    setSession(next);
  }, []);
  const end = useCallback(() => {
    rememberCsrfToken(null);
    setSession(null);
  }, []);
  const state = useMemo(() => ({ session, begin, end }), [session, begin, end]);
  const configuration = useMemo(() => swrConfiguration(end), [end]);
  // One person's answers never outlive their sign-in or role: the cache is thrown away with the key.
  const scope = session ? `${session.person.id}/${session.hat}` : 'nobody';
  return (
    <SessionContext value={state}>
      <SWRConfig key={scope} value={{ ...configuration, provider: () => new Map() }}>
        {children}
      </SWRConfig>
    </SessionContext>
  );
}

/** Signs out and goes to the sign-in page. The page is left even when the service cannot be reached. */
export function useSignOut(): () => Promise<void> {
  const { end } = useSessionState();
  const navigate = useNavigate();
  return async () => {
    await request('identity.sign-out', {}).catch(() => undefined);
    end();
    await navigate('/sign-in', { replace: true });
  };
}
