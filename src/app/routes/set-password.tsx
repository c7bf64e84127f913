import { Link, useNavigate, useSearchParams } from 'react-router';
import { Door } from '#src/features/session/door.tsx';
import { SetPasswordForm } from '#src/features/session/set-password-form.tsx';
import { useTitle } from '#src/lib/use-title.ts';
import { Notice } from '#src/ui/notice.tsx';
import { toast } from '#src/ui/toast.ts';

export function Component() {
  const [asked] = useSearchParams();
  const token = asked.get('token') ?? '';
  const navigate = useNavigate();
  useTitle('Choose a password');
  return (
    <Door title="Choose a password">
      {token === '' ? (
        <Notice kind="alarm" title="This link is not whole">
          Open the link from the mail once more, or{' '}
          <Link to="/sign-in" className="word-link">
            ask for a new one
          </Link>
          .
        </Notice>
      ) : (
        <SetPasswordForm
          token={token}
          onSet={() => {
            toast('Your password is set. Sign in with it.');
            void navigate('/sign-in', { replace: true });
          }}
        />
      )}
    </Door>
  );
}
