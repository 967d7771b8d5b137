import { RequestMethod } from '@nestjs/common';
import { METHOD_METADATA, PATH_METADATA } from '@nestjs/common/constants';
import type { INestApplication } from '@nestjs/common';
import { MetadataScanner, ModulesContainer, Reflector } from '@nestjs/core';
import { designRoles, roles } from '@mantlet/common';
import { z } from 'zod';
import { ACCESS_RULE } from '../../src/shared/access.js';
import type { AccessRule } from '../../src/shared/access.js';

export interface FoundRoute {
  method: 'get' | 'post' | 'put' | 'patch' | 'delete';
  path: string;
  rule: AccessRule | undefined;
}

/** Every route that the running server answers, with its rule, as Nest itself knows them. */
export function routesOf(app: INestApplication): FoundRoute[] {
  const scanner = new MetadataScanner();
  const reflector = app.get(Reflector);
  const controllers = [...app.get(ModulesContainer).values()].flatMap((module) => [...module.controllers.values()]);
  const types = new Set(controllers.map((wrapper) => wrapper.metatype).filter((type): type is new () => object => typeof type === 'function' && 'prototype' in type));
  return [...types].flatMap((type) => {
    const base = paths(reflector.get<string | string[]>(PATH_METADATA, type));
    return scanner.getAllMethodNames(type.prototype as object).flatMap((name): FoundRoute[] => {
      const handler = (type.prototype as Record<string, () => unknown>)[name];
      if (!handler) return [];
      const method = reflector.get<RequestMethod | undefined>(METHOD_METADATA, handler);
      if (method === undefined) return [];
      const rule = reflector.getAllAndOverride<AccessRule | undefined>(ACCESS_RULE, [handler, type]);
      return base.flatMap((first) =>
        paths(reflector.get<string | string[]>(PATH_METADATA, handler)).map((second) => ({ method: RequestMethod[method].toLowerCase() as FoundRoute['method'], path: join(first, second), rule })),
      );
    });
  });
}

const paths = (given: string | string[]): string[] => (Array.isArray(given) ? given : [given]);
const join = (...parts: string[]): string => ['api', ...parts].map((part) => part.replace(/^\/+|\/+$/g, '')).filter(Boolean).map((part) => `/${part}`).join('');

/** The rule in a word or two, as the table of routes writes it. */
export function ruleInWords(rule: AccessRule): string {
  if (rule.kind !== 'project') return rule.kind;
  if (rule.roles === null) return 'team';
  const words = [...rule.roles].sort().join(', ');
  return words === [...designRoles].sort().join(', ') ? 'design team' : words;
}

/** The other way round. */
export function ruleFromWords(words: string): AccessRule {
  if (words === 'public' || words === 'signed-in' || words === 'administrator') return { kind: words };
  if (words === 'team') return { kind: 'project', roles: null };
  if (words === 'design team') return { kind: 'project', roles: designRoles };
  return { kind: 'project', roles: words.split(', ').map((word) => z.enum(roles).parse(word)) };
}
