import { searchRoutes } from '../../shared/contract/search.js';
import { bind, type RouteBinding } from '../http/binding.js';
import type { SearchService } from './search.service.js';

export function searchBindings(service: SearchService): RouteBinding[] {
  return [bind(searchRoutes.search, ({ query, caller }) => service.search(query, caller))];
}
