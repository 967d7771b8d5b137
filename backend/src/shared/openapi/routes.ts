import { RequestMethod } from '@nestjs/common';
import type { INestApplication } from '@nestjs/common';
import { GUARDS_METADATA, HTTP_CODE_METADATA, METHOD_METADATA, PATH_METADATA, ROUTE_ARGS_METADATA } from '@nestjs/common/constants.js';
import { RouteParamtypes } from '@nestjs/common/enums/route-paramtypes.enum.js';
import { MetadataScanner, ModulesContainer, Reflector } from '@nestjs/core';
import { ACCESS_RULE } from '../access.js';
import type { AccessRule } from '../access.js';
import { RETURNED } from './returns.js';
import type { Returned } from './returns.js';

export interface FoundRoute {
  method: 'get' | 'post' | 'put' | 'patch' | 'delete';
  /** with the prefix, as Nest writes it: /api/projects/:projectId */
  path: string;
  rule: AccessRule | undefined;
  returned: Returned | undefined;
  /** of the answer where all went well */
  status: number;
  /** takes a file, as multipart/form-data */
  uploads: boolean;
  throttled: boolean;
}

type Handler = () => unknown;

/** Every route that the running server answers, with what its decorators say, as Nest itself knows them. */
export function routesOf(app: INestApplication): FoundRoute[] {
  const scanner = new MetadataScanner();
  const reflector = app.get(Reflector);
  const controllers = [...app.get(ModulesContainer).values()].flatMap((module) => [...module.controllers.values()]);
  const types = new Set(controllers.map((wrapper) => wrapper.metatype).filter((type): type is new () => object => typeof type === 'function' && 'prototype' in type));
  return [...types].flatMap((type) => {
    const base = paths(reflector.get<string | string[]>(PATH_METADATA, type));
    return scanner.getAllMethodNames(type.prototype as object).flatMap((name): FoundRoute[] => {
      const handler = (type.prototype as Record<string, Handler>)[name];
      if (!handler) return [];
      const method = reflector.get<RequestMethod | undefined>(METHOD_METADATA, handler);
      if (method === undefined) return [];
      const verb = RequestMethod[method].toLowerCase() as FoundRoute['method'];
      const stated = {
        method: verb,
        rule: reflector.getAllAndOverride<AccessRule | undefined>(ACCESS_RULE, [handler, type]),
        returned: reflector.get<Returned | undefined>(RETURNED, handler),
        status: reflector.get<number | undefined>(HTTP_CODE_METADATA, handler) ?? (verb === 'post' ? 201 : 200),
        uploads: takesFile(type, name),
        throttled: (reflector.getAllAndOverride<{ name?: string }[] | undefined>(GUARDS_METADATA, [handler, type]) ?? []).some((guard) => guard.name?.includes('Throttler')),
      };
      return base.flatMap((first) => paths(reflector.get<string | string[]>(PATH_METADATA, handler)).map((second) => ({ ...stated, path: join(first, second) })));
    });
  });
}

function takesFile(type: object, name: string): boolean {
  const given = (Reflect.getMetadata(ROUTE_ARGS_METADATA, type, name) ?? {}) as Record<string, unknown>;
  return Object.keys(given).some((key) => key.startsWith(`${RouteParamtypes.FILE}:`));
}
const paths = (given: string | string[]): string[] => (Array.isArray(given) ? given : [given]);
const join = (...parts: string[]): string => ['api', ...parts].map((part) => part.replace(/^\/+|\/+$/g, '')).filter(Boolean).map((part) => `/${part}`).join('');
