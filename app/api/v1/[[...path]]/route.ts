import { getServer } from '@/app/_server/context';
import { problemResponse } from '@/app/_server/problem-response';
import { AppError } from '@/lib/errors';

function answerNotFound(request: Request): Response {
  const error = new AppError('not-found', `There is no call ${request.method} ${new URL(request.url).pathname}. /api/v1/openapi.json lists them all.`);
  return problemResponse(error, getServer().context.log);
}

export const GET = answerNotFound;
export const POST = answerNotFound;
export const PUT = answerNotFound;
export const PATCH = answerNotFound;
export const DELETE = answerNotFound;
