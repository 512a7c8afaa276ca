import { Module } from '@nestjs/common';
import { MembersController } from './members.controller.js';
import { MembersService } from './members.service.js';
import { Passwords } from './passwords.js';

@Module({
  controllers: [MembersController],
  providers: [MembersService, Passwords],
  exports: [MembersService, Passwords],
})
export class MembersModule {}
