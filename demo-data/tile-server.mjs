// A local stand-in for an online tile server: same addresses (/{z}/{x}/{y}.png), drawn ground
// instead of a real map, so that the demo and the tests work without a network.
import http from 'node:http';
import { Buffer } from 'node:buffer';
import { deflateSync, crc32 as zlibCrc32 } from 'node:zlib';

const SIZE = 256;
const CRC_TABLE = Array.from({ length: 256 }, (_, n) => {
  let c = n;
  for (let k = 0; k < 8; k += 1) c = c & 1 ? 0xedb88320 ^ (c >>> 1) : c >>> 1;
  return c >>> 0;
});

function crc32(bytes) {
  if (zlibCrc32) return zlibCrc32(bytes);
  let crc = 0xffffffff;
  for (const byte of bytes) crc = CRC_TABLE[(crc ^ byte) & 0xff] ^ (crc >>> 8);
  return (crc ^ 0xffffffff) >>> 0;
}

function chunk(type, data) {
  const body = Buffer.concat([Buffer.from(type, 'latin1'), data]);
  const out = Buffer.alloc(body.length + 8);
  out.writeUInt32BE(data.length, 0);
  body.copy(out, 4);
  out.writeUInt32BE(crc32(body), body.length + 4);
  return out;
}

/** PNG (8-bit RGB) of `SIZE` x `SIZE` pixels from rows of raw bytes. */
function png(raw) {
  const header = Buffer.alloc(13);
  header.writeUInt32BE(SIZE, 0);
  header.writeUInt32BE(SIZE, 4);
  header.set([8, 2, 0, 0, 0], 8);
  return Buffer.concat([
    Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]),
    chunk('IHDR', header),
    chunk('IDAT', deflateSync(raw, { level: 6 })),
    chunk('IEND', Buffer.alloc(0)),
  ]);
}

/** Repeatable value in 0-1 for a lattice point. */
function lattice(ix, iy, seed) {
  let h = Math.imul(ix, 374761393) ^ Math.imul(iy, 668265263) ^ Math.imul(seed, 2147483647);
  h = Math.imul(h ^ (h >>> 13), 1274126177);
  return ((h ^ (h >>> 16)) >>> 0) / 4294967296;
}

function noise(x, y, seed) {
  const ix = Math.floor(x);
  const iy = Math.floor(y);
  const sx = (x - ix) ** 2 * (3 - 2 * (x - ix));
  const sy = (y - iy) ** 2 * (3 - 2 * (y - iy));
  const top = lattice(ix, iy, seed) * (1 - sx) + lattice(ix + 1, iy, seed) * sx;
  const bottom = lattice(ix, iy + 1, seed) * (1 - sx) + lattice(ix + 1, iy + 1, seed) * sx;
  return top * (1 - sy) + bottom * sy;
}

/** Pale land with contour lines; `scale` is world units per pixel at this zoom. */
function drawTile(z, x, y) {
  const raw = Buffer.alloc(SIZE * (SIZE * 3 + 1));
  const unit = 2 ** (15 - z) / 256;
  for (let row = 0; row < SIZE; row += 1) {
    const start = row * (SIZE * 3 + 1) + 1;
    for (let column = 0; column < SIZE; column += 1) {
      const wx = (x * SIZE + column) * unit;
      const wy = (y * SIZE + row) * unit;
      const height = noise(wx / 1.7, wy / 1.7, 1) * 0.65 + noise(wx * 1.9, wy * 1.9, 2) * 0.35;
      const wood = noise(wx * 1.3 + 40, wy * 1.3, 3) > 0.72;
      const step = (height * 22) % 1;
      // Zoomed out, contours would crowd into noise.
      const line = z >= 13 && step < 0.05 * Math.max(1, unit * 160);
      const base = wood ? [206, 219, 196] : [240 - height * 14, 235 - height * 10, 218 - height * 22];
      const shade = line ? 0.94 : 1;
      for (let band = 0; band < 3; band += 1) raw[start + column * 3 + band] = base[band] * shade;
    }
  }
  return png(raw);
}

/** Start the server; resolves to { url, close }. Port 0 takes any free port. */
export function startTileServer(port = 0) {
  const cache = new Map();
  const server = http.createServer((request, response) => {
    const match = /^\/(\d{1,2})\/(\d+)\/(\d+)\.png$/.exec(new URL(request.url, 'http://tiles').pathname);
    if (!match) {
      response.writeHead(404).end();
      return;
    }
    const key = match[0];
    if (!cache.has(key)) {
      if (cache.size > 2000) cache.clear();
      cache.set(key, drawTile(Number(match[1]), Number(match[2]), Number(match[3])));
    }
    response.writeHead(200, { 'content-type': 'image/png', 'cache-control': 'max-age=86400' });
    response.end(cache.get(key));
  });
  return new Promise((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, '127.0.0.1', () => {
      const { port: taken } = server.address();
      resolve({
        url: `http://127.0.0.1:${taken}/{z}/{x}/{y}.png`,
        close: () => new Promise((done) => server.close(done)),
      });
    });
  });
}
