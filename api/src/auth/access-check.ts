import { Injectable, RequestMethod, type OnApplicationBootstrap } from '@nestjs/common';
import { METHOD_METADATA, PATH_METADATA } from '@nestjs/common/constants.js';
import { DiscoveryService, MetadataScanner } from '@nestjs/core';
import { ACCESS } from '../common/access.decorator.js';

/** The server does not start with a handler that names no permission and does not say it is public. */
@Injectable()
export class AccessCheck implements OnApplicationBootstrap {
  constructor(
    private readonly discovery: DiscoveryService,
    private readonly scanner: MetadataScanner,
  ) {}

  onApplicationBootstrap(): void {
    const unmapped = this.discovery.getControllers().flatMap(({ metatype }) => {
      const prototype: unknown = metatype?.prototype;
      if (!prototype || typeof prototype !== 'object') return [];
      return this.scanner
        .getAllMethodNames(prototype)
        .filter((name) => isOpen((prototype as Record<string, object>)[name]))
        .map((name) => `${metatype?.name}.${name}`);
    });
    if (unmapped.length > 0) {
      throw new Error(`These handlers name no permission: ${unmapped.join(', ')}`);
    }
  }
}

function isOpen(handler: object): boolean {
  const method: RequestMethod | undefined = Reflect.getMetadata(METHOD_METADATA, handler);
  return (
    method !== undefined &&
    Reflect.hasMetadata(PATH_METADATA, handler) &&
    !Reflect.hasMetadata(ACCESS, handler)
  );
}
