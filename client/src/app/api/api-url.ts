import { HttpParams } from '@angular/common/http';

const BASE = '/api/v1';

/**
 * The address of an endpoint: each `:name` of the path replaced, the whole under `/api/v1`.
 * A missing parameter throws, as the request could only miss.
 *
 * @example apiUrl('/stores/:id/units', { id: 'a b' }) // '/api/v1/stores/a%20b/units'
 */
export function apiUrl(path: string, params: Readonly<Record<string, unknown>> = {}): string {
  return (
    BASE +
    path.replace(/:([A-Za-z]\w*)/g, (_, name: string) => {
      const value = params[name];
      if (value === undefined || value === null || value === '') {
        throw new Error(`The path ${path} needs "${name}".`);
      }
      return encodeURIComponent(String(value));
    })
  );
}

/**
 * Query parameters as the server reads them: nothing for what is absent or empty, a list joined
 * by commas (a name given twice is refused there).
 */
export function apiQuery(query: Readonly<Record<string, unknown>> = {}): HttpParams {
  let params = new HttpParams();
  for (const [name, value] of Object.entries(query)) {
    if (value === undefined || value === null || value === '') continue;
    if (Array.isArray(value)) {
      if (value.length > 0) params = params.set(name, value.join(','));
    } else {
      params = params.set(name, String(value));
    }
  }
  return params;
}
