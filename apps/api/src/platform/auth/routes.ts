import { RequestMethod, type INestApplication } from '@nestjs/common';
import { METHOD_METADATA, PATH_METADATA } from '@nestjs/common/constants.js';
import { DiscoveryService, MetadataScanner } from '@nestjs/core';
import { ACCESS, type Access } from './access.decorators.js';

/** A route as Nest has registered it, without the global prefix. */
export interface RegisteredRoute {
  method: string;
  path: string;
  /** Class and method, for messages. */
  handler: string;
  access: Access | null;
}

/** Every route of every controller; the test walks and the check at the start read the same list. */
export function registeredRoutes(app: INestApplication): RegisteredRoute[] {
  const scanner = new MetadataScanner();
  return app
    .get(DiscoveryService)
    .getControllers()
    .flatMap(({ metatype, name: controller }) => {
      if (typeof metatype !== 'function') return [];
      const prototype: unknown = metatype.prototype;
      if (typeof prototype !== 'object' || prototype === null) return [];
      return scanner.getAllMethodNames(prototype).flatMap((name) => {
        const handler: unknown = Reflect.get(prototype, name);
        return typeof handler === 'function' ? routesOf(metatype, handler, `${controller}.${name}`) : [];
      });
    });
}

function routesOf(controller: object, method: object, handler: string): RegisteredRoute[] {
  const paths = pathsOf(Reflect.getMetadata(PATH_METADATA, method));
  const verb: unknown = Reflect.getMetadata(METHOD_METADATA, method);
  if (paths === null || typeof verb !== 'number') return [];
  const bases = pathsOf(Reflect.getMetadata(PATH_METADATA, controller)) ?? [''];
  return bases.flatMap((base) =>
    paths.map((path) => ({
      method: RequestMethod[verb] ?? 'ALL',
      path: `/${[base, path]
        .flatMap((part) => part.split('/'))
        .filter((part) => part !== '')
        .join('/')}`,
      handler,
      access: accessOf(method) ?? accessOf(controller),
    })),
  );
}

function accessOf(target: object): Access | null {
  // Only the decorators of access.decorators.ts write under this key.
  return (Reflect.getMetadata(ACCESS, target) as Access | undefined) ?? null;
}

function pathsOf(metadata: unknown): string[] | null {
  if (typeof metadata === 'string') return [metadata];
  return Array.isArray(metadata) ? metadata.filter((path) => typeof path === 'string') : null;
}

/** Sentences on routes that say not who may call them, or say it against their own path. */
export function routeComplaints(routes: readonly RegisteredRoute[]): string[] {
  return routes.flatMap(({ method, path, handler, access }) => {
    const inDarkroom = path.split('/').includes(':darkroomId');
    const named = `${method} ${path} (${handler})`;
    if (access === null) return [`${named} does not say who may call it.`];
    if (access.kind === 'role' && !inDarkroom) return [`${named} asks for a role but names no darkroom.`];
    if (access.kind === 'signed-in' && inDarkroom)
      return [`${named} names a darkroom but asks for no role in it.`];
    return [];
  });
}

/** @throws Error naming every route that is not closed. */
export function refuseOpenRoutes(app: INestApplication): void {
  const complaints = routeComplaints(registeredRoutes(app));
  if (complaints.length > 0) throw new Error(complaints.join('\n'));
}
