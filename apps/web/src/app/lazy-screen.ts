import type { ComponentType } from 'react';
import type { RouteObject } from 'react-router-dom';
import { loadAreas } from '../i18n/i18n';

/** A screen that is fetched when its address is opened, together with the texts of its areas. */
export function lazyScreen(
  load: () => Promise<{ Component: ComponentType }>,
  areas: string[],
): Pick<RouteObject, 'lazy'> {
  return {
    lazy: async () => {
      const [screen] = await Promise.all([load(), loadAreas(areas)]);
      return { Component: screen.Component };
    },
  };
}
