import type { INestApplicationContext } from '@nestjs/common';
import { NestFactory } from '@nestjs/core';
import type { NestExpressApplication } from '@nestjs/platform-express';
import { AppModule } from './app.module.js';
import { configureHttp } from './common/http-setup.js';
import { Log } from './common/log.js';
import { loadConfig, type AppConfig } from './config/app-config.js';

/** The server, ready to listen. */
export async function createApp(config: AppConfig): Promise<NestExpressApplication> {
  const app = await NestFactory.create<NestExpressApplication>(AppModule.with(config), {
    bodyParser: false,
    bufferLogs: true,
    abortOnError: false,
  });
  app.useLogger(app.get(Log));
  configureHttp(app);
  return app;
}

/** All services without the web, for seeds and commands. */
export async function createAppContext(
  config: AppConfig = loadConfig(process.env),
): Promise<INestApplicationContext> {
  return NestFactory.createApplicationContext(AppModule.with(config), {
    logger: ['error', 'warn'],
    abortOnError: false,
  });
}
