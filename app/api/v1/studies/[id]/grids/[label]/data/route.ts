import { route } from '@/app/_server/route';
import { putDataContract } from '@/lib/domain/uploads/schema';
import { putData } from '@/lib/services/uploads/put-data';

async function* nothing(): AsyncGenerator<Uint8Array> {}

export const PUT = route(putDataContract, ({ ctx, params, query, request }) => putData(ctx, params, {
  filename: query.filename,
  body: (request.body as AsyncIterable<Uint8Array> | null) ?? nothing(),
  contentLength: request.headers.get('content-length'),
  reprDigest: request.headers.get('repr-digest'),
}));
