import { getServer } from '@/app/_server/context';
import { route } from '@/app/_server/route';
import { paceOfFiles, timelyBody } from '@/app/_server/timely-body';
import { putDataContract } from '@/lib/domain/uploads/schema';
import { putData } from '@/lib/services/uploads/put-data';

async function* nothing(): AsyncGenerator<Uint8Array> {}

export const PUT = route(putDataContract, ({ ctx, params, query, request }) => putData(ctx, params, {
  filename: query.filename,
  body: timelyBody((request.body as AsyncIterable<Uint8Array> | null) ?? nothing(), paceOfFiles(getServer().env.BODY_SECONDS)),
  contentLength: request.headers.get('content-length'),
  reprDigest: request.headers.get('repr-digest'),
}));
