/** A file's own name as it is sent, percent-encoded in the header X-File-Name; it never becomes a path. */
export function sentName(headers: Headers): string {
  const sent = headers.get('x-file-name') ?? '';
  try {
    return decodeURIComponent(sent);
  } catch {
    return sent;
  }
}
