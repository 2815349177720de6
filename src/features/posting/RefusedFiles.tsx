import type { RefusedFile } from '../../../shared/api/drafts.ts';
import { Card } from '../../components/Card.tsx';

const SHOWN = 12;

/** Each file that cannot be used, by name, with its reason. Everything else was kept. */
export function RefusedFiles({ files }: { files: RefusedFile[] }) {
  if (files.length === 0) return null;
  return (
    <Card className="px-4 py-3" aria-labelledby="refused" aria-live="polite">
      <h2 id="refused" className="text-md">
        {files.length === 1 ? 'One file was' : `${files.length} files were`} left out
      </h2>
      <p className="text-sm text-graphite">The rest of the strip is kept.</p>
      <ul className="mt-1 divide-y divide-rule text-sm">
        {files.slice(0, SHOWN).map((file) => (
          <li key={file.name} className="py-1.5">
            {file.reason.includes(file.name) ? (
              <span className="break-words">{file.reason}</span>
            ) : (
              <>
                <span className="font-mono text-xs font-semibold break-all">{file.name}</span>{' '}
                <span className="text-graphite">{file.reason}</span>
              </>
            )}
          </li>
        ))}
      </ul>
      {files.length > SHOWN && (
        <p className="text-sm text-graphite">and {files.length - SHOWN} more for like reasons.</p>
      )}
    </Card>
  );
}
