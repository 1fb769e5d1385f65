/** What stands in for a page that is still being read. It says so in words and does not move. */
export function Waiting({ words }: { words: string }) {
  return (
    <p role="status" className="quiet" style={{ minHeight: '60vh', paddingTop: 8 }}>
      {words}
    </p>
  );
}
