import { HttpResponse } from 'msw';

/** A refusal as the API words it. */
export function problem(
  status: number,
  detail: string,
  errors?: { path: string; message: string }[],
) {
  return HttpResponse.json(
    {
      type: 'about:blank',
      title: 'Not accepted',
      status,
      code: 'test-problem',
      detail,
      requestId: 'req-test',
      errors,
    },
    { status },
  );
}
