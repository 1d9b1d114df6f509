import { RouterProvider } from 'react-router-dom';
import { Providers } from './providers';
import { createRouter } from './router';

const router = createRouter();

export function Application() {
  return (
    <Providers>
      <RouterProvider router={router} />
    </Providers>
  );
}
