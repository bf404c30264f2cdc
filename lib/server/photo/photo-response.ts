import 'server-only';

/** A kept photo as an answer: nothing in it can run, and only the person who asked may keep a copy. */
export function photoResponse(bytes: Uint8Array): Response {
  return new Response(new Uint8Array(bytes), {
    headers: {
      'content-type': 'image/jpeg',
      'content-disposition': 'inline',
      'content-security-policy': "default-src 'none'; sandbox",
      'cross-origin-resource-policy': 'same-origin',
      'x-content-type-options': 'nosniff',
      // A photo never changes; the access check is made again after an hour.
      'cache-control': 'private, max-age=3600',
    },
  });
}
