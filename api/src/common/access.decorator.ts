import type { Permission } from '@furrowlight/shared/access/permissions';
import { applyDecorators, SetMetadata } from '@nestjs/common';
import { ApiExtension } from '@nestjs/swagger';

export const ACCESS = 'furrowlight:access';

/** What a handler asks of its caller; every handler carries one of the two. */
export type AccessRule = { public: true } | { public: false; permission: Permission };

/** Only holders of the permission get in. */
export const Access = (permission: Permission) =>
  applyDecorators(
    SetMetadata(ACCESS, { public: false, permission } satisfies AccessRule),
    ApiExtension('x-permission', permission),
  );

/** Anyone gets in. */
export const Public = () => SetMetadata(ACCESS, { public: true } satisfies AccessRule);
