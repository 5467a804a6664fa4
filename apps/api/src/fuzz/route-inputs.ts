import type { INestApplication, PipeTransform, Type } from '@nestjs/common';
import { PATH_METADATA, ROUTE_ARGS_METADATA } from '@nestjs/common/constants.js';
import { DiscoveryService, MetadataScanner } from '@nestjs/core';
import { registeredRoutes } from '../platform/auth/routes.js';

const KINDS = { 3: 'body', 4: 'query', 5: 'path' } as const;

/** What a handler takes out of a request: a class, or one named part. */
export interface RouteInput {
  /** Method and path as OpenAPI writes them: `put /darkrooms/{darkroomId}/loads/{actionId}`. */
  route: string;
  in: 'body' | 'query' | 'path';
  /** A path parameter's name. */
  name: string | undefined;
  metatype: Type | undefined;
  /** Pipes of the parameter's own. */
  pipes: readonly Type<PipeTransform>[];
}

interface Argument {
  index: number;
  data?: unknown;
  pipes?: Type<PipeTransform>[];
}

/** Every body, query and path parameter that a handler takes. */
export function routeInputs(app: INestApplication): RouteInput[] {
  const routes = new Map(registeredRoutes(app).map((route) => [route.handler, route]));
  const scanner = new MetadataScanner();
  return app
    .get(DiscoveryService)
    .getControllers()
    .flatMap(({ metatype: controller }) => {
      if (typeof controller !== 'function') return [];
      const prototype = controller.prototype as object;
      return scanner.getAllMethodNames(prototype).flatMap((method) => {
        const route = routes.get(`${controller.name}.${method}`);
        const handler = Reflect.get(prototype, method) as object;
        if (!route || Reflect.getMetadata(PATH_METADATA, handler) === undefined) return [];
        const named = `${route.method.toLowerCase()} ${route.path.replace(/:(\w+)/g, '{$1}')}`;
        return inputsOf(controller, method).map((input) => ({ ...input, route: named }));
      });
    });
}

function inputsOf(controller: object, method: string): Omit<RouteInput, 'route'>[] {
  // Nest's own decorators write these under their keys.
  const taken = (Reflect.getMetadata(ROUTE_ARGS_METADATA, controller, method) ?? {}) as Record<
    string,
    Argument
  >;
  const { prototype } = controller as { prototype: object };
  const types = (Reflect.getMetadata('design:paramtypes', prototype, method) ?? []) as (Type | undefined)[];
  // Own parameters are registered on the constructor, under "3:0" and the like.
  return Object.entries(taken).flatMap(([key, { index, data, pipes = [] }]) => {
    const kind = KINDS[Number(key.split(':')[0]) as keyof typeof KINDS];
    if (kind === undefined) return [];
    const name = typeof data === 'string' ? data : undefined;
    return [{ in: kind, name, metatype: types[index], pipes }];
  });
}
