import { useQuery } from '@tanstack/react-query';
import { Navigate, useSearchParams } from 'react-router-dom';
import { sessionQuery } from '#client/src/features/session/api.ts';
import { SignInForm } from '#client/src/features/session/sign-in-form.tsx';
import { paths } from '#client/src/lib/paths.ts';
import { PageCrumbs } from '#client/src/ui/page-crumbs.tsx';
import { Wordmark } from '#client/src/ui/wordmark.tsx';
import { SignInDrawing } from './sign-in-drawing.tsx';

/** Only addresses of this application are gone back to. */
const safeReturn = (to: string | null): string =>
  to !== null && to.startsWith('/') && !to.startsWith('//') ? to : paths.projects();

export function SignInPage() {
  const session = useQuery(sessionQuery());
  const [params] = useSearchParams();
  if (session.data?.person) return <Navigate to={safeReturn(params.get('to'))} replace />;
  return (
    <main className="grid min-h-dvh lg:grid-cols-[1fr_minmax(24rem,30rem)]">
      <PageCrumbs crumbs={[{ label: 'Sign in' }]} />
      <div className="hidden border-r border-rule lg:flex lg:items-end">
        <SignInDrawing />
      </div>
      <div className="flex flex-col justify-center gap-8 bg-sheet px-6 py-10 sm:px-12">
        <div>
          <h1>
            <Wordmark isLarge />
          </h1>
          <p className="mt-3 max-w-sm text-lg text-muted">
            Every buildable concrete beam section that carries the load, and which of them to choose.
          </p>
        </div>
        <div className="max-w-sm">
          <SignInForm onSignedIn={() => undefined} />
        </div>
      </div>
    </main>
  );
}
