import { z } from 'zod';

/** A tile layer of the map; more may be configured. */
export const TileLayer = z.object({
  name: z.string(),
  url: z.string(),
  attribution: z.string(),
  maxZoom: z.int(),
});

/** What the client must know before anyone signs in. */
export const ClientConfig = z.object({
  version: z.string(),
  modelVersion: z.string(),
  demo: z.boolean(),
  /** Demo sign-ins, only while the demo cooperative is the server's own. */
  demoAccounts: z.array(z.object({ role: z.string(), email: z.string(), password: z.string() })),
  tileLayers: z.array(TileLayer),
});
export type ClientConfig = z.infer<typeof ClientConfig>;
