'use client';

import { useRef, useState } from 'react';
import styles from './file-drop.module.css';

const sizeText = (bytes: number) =>
  bytes === 0
    ? 'empty'
    : bytes < 1e6
      ? `${Math.max(1, Math.round(bytes / 1e3))} kB`
      : `${(bytes / 1e6).toFixed(1)} MB`;

/**
 * A place to drop or choose files. It is an ordinary file field underneath, so it works by key and inside a plain
 * form; `onFiles` hears of every change for pages that send the files themselves.
 */
export function FileDrop(props: {
  name: string;
  label: string;
  hint: string;
  accept?: string;
  multiple?: boolean;
  onFiles?: (files: File[]) => void;
}) {
  const input = useRef<HTMLInputElement>(null);
  const [files, setFiles] = useState<File[]>([]);
  const [over, setOver] = useState(false);

  const take = (list: FileList | null) => {
    const taken = [...(list ?? [])];
    setFiles(taken);
    props.onFiles?.(taken);
  };

  return (
    <div
      className={styles.drop}
      data-over={over}
      onDragOver={(event) => {
        event.preventDefault();
        setOver(true);
      }}
      onDragLeave={() => setOver(false)}
      onDrop={(event) => {
        event.preventDefault();
        setOver(false);
        if (input.current === null || event.dataTransfer.files.length === 0) return;
        input.current.files = event.dataTransfer.files;
        take(event.dataTransfer.files);
      }}
    >
      <label htmlFor={props.name}>{props.label}</label>
      <input
        ref={input}
        id={props.name}
        name={props.name}
        type="file"
        accept={props.accept}
        multiple={props.multiple}
        aria-describedby={`${props.name}-hint`}
        onChange={(event) => take(event.target.files)}
      />
      <p id={`${props.name}-hint`} className="quiet small">
        {props.hint}
      </p>
      {files.length > 0 && (
        <p role="status">{files.map((file) => `${file.name}, ${sizeText(file.size)}`).join(' · ')}</p>
      )}
    </div>
  );
}
