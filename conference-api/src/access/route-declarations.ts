import { Injectable, type OnApplicationBootstrap } from '@nestjs/common';
import { METHOD_METADATA, PATH_METADATA } from '@nestjs/common/constants.js';
import { DiscoveryService, MetadataScanner, Reflector } from '@nestjs/core';
import { RequestMethod } from '@nestjs/common';
import type { Permission } from './permission.js';
import { DECLARATION, type RouteDeclaration } from '../common/decorators/route-access.decorator.js';

export interface DeclaredRoute {
  method: string;
  path: string;
  declaration: RouteDeclaration;
  permission?: Permission;
}

/** Lists every route with what it declares; one that declares nothing stops the server from starting. */
@Injectable()
export class RouteDeclarations implements OnApplicationBootstrap {
  constructor(
    private readonly discovery: DiscoveryService,
    private readonly scanner: MetadataScanner,
    private readonly reflector: Reflector,
  ) {}

  onApplicationBootstrap() {
    this.list();
  }

  list(): DeclaredRoute[] {
    return this.discovery.getControllers().flatMap((wrapper) => {
      const { instance, metatype } = wrapper as { instance: object; metatype: Function };
      const base: string = Reflect.getMetadata(PATH_METADATA, metatype) ?? '';
      return this.scanner.getAllMethodNames(Object.getPrototypeOf(instance)).flatMap((name) => {
        const handler = (instance as Record<string, Function>)[name]!;
        const method: number | undefined = Reflect.getMetadata(METHOD_METADATA, handler);
        if (method === undefined) return [];
        const declaration = this.reflector.getAllAndOverride<RouteDeclaration | undefined>(DECLARATION, [handler, metatype]);
        if (!declaration) throw new Error(`${metatype.name}.${name} declares neither a permission nor @Public()`);
        const paths = [Reflect.getMetadata(PATH_METADATA, handler)].flat() as string[];
        return paths.map((path) => ({ method: RequestMethod[method]!, path: `/api/${base}/${path}`.replace(/\/+/g, '/').replace(/(.)\/$/, '$1'), declaration }));
      });
    });
  }
}
