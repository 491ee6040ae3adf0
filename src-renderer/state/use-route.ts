import { onScopeDispose, shallowRef, type ShallowRef } from 'vue';
import { hashOfRoute, routeOfHash, type Route } from './route.ts';

/** The current place, following the address; every place has a link that can be kept and opened again. */
export function useRoute(): { route: Readonly<ShallowRef<Route>> } {
  const route = shallowRef(routeOfHash(location.hash));
  const follow = () => (route.value = routeOfHash(location.hash));
  addEventListener('hashchange', follow);
  onScopeDispose(() => removeEventListener('hashchange', follow));
  return { route };
}

export function goTo(route: Route): void {
  location.hash = hashOfRoute(route);
}

/** Goes to a place without leaving the present one behind in the history: for places that are not there to be gone back to. */
export function redirectTo(route: Route): void {
  location.replace(hashOfRoute(route));
}
