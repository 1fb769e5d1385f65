'use client';

import { useRouter } from 'next/navigation';
import { useRef, useState } from 'react';
import { Button } from '@/app/_ui/button';
import { FileDrop } from '@/app/_ui/file-drop';
import { Notice } from '@/app/_ui/notice';

type Sending = { state: 'idle' } | { state: 'sending'; share: number } | { state: 'failed'; reason: string };

/** Sends a chosen file as it is, so that half a gigabyte is never held in the page, and goes to its check. */
export function UploadForm({ mostBytes }: { mostBytes: number }) {
  const router = useRouter();
  const [files, setFiles] = useState<File[]>([]);
  const [sending, setSending] = useState<Sending>({ state: 'idle' });
  const request = useRef<XMLHttpRequest | null>(null);

  const failed = (reason: string) => setSending({ state: 'failed', reason });

  const send = () => {
    const [file] = files;
    if (file === undefined) return failed('Choose a file first.');
    if (files.length > 1) return failed('One file at a time; several at once go by the command line.');
    if (file.size === 0) return failed(`${file.name} is empty.`);
    if (file.size > mostBytes) {
      return failed(`${file.name} is larger than ${mostBytes / 1e6} MB: record it on the command line.`);
    }
    const xhr = new XMLHttpRequest();
    request.current = xhr;
    xhr.open('POST', '/api/intake');
    xhr.setRequestHeader('content-type', 'text/csv');
    xhr.setRequestHeader('x-file-name', encodeURIComponent(file.name.slice(0, 200)));
    xhr.upload.onprogress = (event) => setSending({ state: 'sending', share: event.loaded / file.size });
    xhr.onerror = () => failed('The file did not arrive whole. Is it still there, and the server reachable?');
    xhr.onabort = () => setSending({ state: 'idle' });
    xhr.onload = () => {
      const answer = answerOf(xhr.responseText);
      if (xhr.status === 201 && answer.href !== undefined) router.push(answer.href);
      else failed(answer.detail ?? `The server answered ${xhr.status}.`);
    };
    setSending({ state: 'sending', share: 0 });
    xhr.send(file);
  };

  const busy = sending.state === 'sending';
  return (
    <form
      aria-label="Send a wafer-map file"
      onSubmit={(event) => {
        event.preventDefault();
        if (!busy) send();
      }}
    >
      <FileDrop
        name="file"
        label="Drop a wafer-map file here, or choose one"
        hint={`CSV, one row per reading, up to ${mostBytes / 1e6} MB. Nothing is recorded before you have seen what it holds.`}
        accept=".csv,text/csv"
        onFiles={(chosen) => {
          setFiles(chosen);
          setSending({ state: 'idle' });
        }}
      />
      {sending.state === 'failed' && <Notice kind="call">{sending.reason}</Notice>}
      <p style={{ display: 'flex', gap: 16, alignItems: 'center', margin: '12px 0' }}>
        <Button type="submit" weight="main" aria-disabled={busy}>
          {busy ? 'Sending…' : 'Check this file'}
        </Button>
        {busy && (
          <>
            <progress value={sending.share} max={1} aria-label="Sent" />
            <span className="quiet">{Math.floor(100 * sending.share)} %</span>
            <Button onClick={() => request.current?.abort()}>Stop</Button>
          </>
        )}
      </p>
    </form>
  );
}

function answerOf(text: string): { href?: string; detail?: string } {
  try {
    return JSON.parse(text) as { href?: string; detail?: string };
  } catch {
    return {};
  }
}
