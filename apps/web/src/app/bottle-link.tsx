import { Navigate, useParams } from 'react-router-dom';
import { useMe } from '../features/sign-in/api/get-me.js';
import { paths } from '../shared/routes/paths.js';

/** The short address on a bottle's label: it outlives a darkroom's change of name. */
export function BottleLink() {
  const { darkroomId = '', code = '' } = useParams();
  const darkroom = useMe().data?.darkrooms.find(({ id }) => id === darkroomId);
  return <Navigate to={paths.bottle(darkroom?.shortName ?? darkroomId, code)} replace />;
}
