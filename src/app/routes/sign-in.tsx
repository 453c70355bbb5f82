import { useQueryClient } from '@tanstack/react-query';
import { useNavigate, useSearchParams } from 'react-router-dom';
import { Door } from '../../features/account/components/door.tsx';
import { SignInForm } from '../../features/account/components/sign-in-form.tsx';

/** Only a path of our own is gone back to: another site's address must not be reached through the sign-in. */
const safePath = (back: string | null): string => (back && /^\/(?![/\\])/.test(back) ? back : '/');

export function Component() {
  const navigate = useNavigate();
  const queryClient = useQueryClient();
  const [params] = useSearchParams();
  return (
    <Door title="Sign in">
      <SignInForm
        onSignedIn={() => {
          queryClient.clear();
          void navigate(safePath(params.get('back')), { replace: true });
        }}
      />
    </Door>
  );
}
