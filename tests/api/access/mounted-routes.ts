import type { Express } from 'express';

interface Layer {
  readonly slash: boolean;
  readonly path?: string;
  readonly route?: { readonly path: string | string[]; readonly methods: Readonly<Record<string, boolean>> };
  readonly handle: { readonly stack?: readonly Layer[] };
  match(path: string): boolean;
}

/** Where a router without routes of its own path is mounted, found by asking which of these it answers to. */
const PREFIXES = ['/api', '/w', '/assets'];

function prefixOf(layer: Layer): string {
  if (layer.slash) return '';
  const prefix = PREFIXES.find((path) => layer.match(`${path}/x`));
  if (prefix === undefined) throw new Error('a router is mounted at a path that this walk does not know');
  return prefix;
}

function walk(stack: readonly Layer[], prefix: string): string[] {
  return stack.flatMap((layer) => {
    if (layer.route) {
      const { path, methods } = layer.route;
      const names = Object.keys(methods).filter((method) => methods[method]);
      return [path].flat().flatMap((one) => names.map((name) => `${name.toUpperCase()} ${prefix}${one}`));
    }
    return layer.handle.stack ? walk(layer.handle.stack, prefix + prefixOf(layer)) : [];
  });
}

/** Every route the server answers to, as `METHOD /path/:param`. */
export function mountedRoutes(app: Express): string[] {
  return [...new Set(walk((app.router as unknown as { stack: Layer[] }).stack, ''))].sort();
}
