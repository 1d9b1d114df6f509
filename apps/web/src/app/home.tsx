import { Navigate } from 'react-router-dom';
import { useHat } from '../lib/session';
import { NAVIGATION } from './navigation';

/** The home of the hat that is worn. */
export function Home() {
  return <Navigate to={NAVIGATION[useHat()][0].path} replace />;
}
