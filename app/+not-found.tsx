import { NotFound } from '@/components/team/not-found';

export default function NotFoundRoute() {
  return <NotFound />;
}
