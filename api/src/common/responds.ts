import { applyDecorators, SetMetadata } from '@nestjs/common';
import { ApiResponse } from '@nestjs/swagger';
import type { z } from 'zod';

export const ANSWER_SCHEMA = 'furrowlight:answer-schema';

/** Names the contract's schema of a handler's answer; nothing outside it leaves the server. */
export const Responds = (schema: z.ZodType, status = 200, description = 'Done') =>
  applyDecorators(
    SetMetadata(ANSWER_SCHEMA, schema),
    ApiResponse({ status, description, standardSchema: schema }),
  );
