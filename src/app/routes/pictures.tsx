import { mayDo } from '../../../shared/abilities/ability.ts';
import { PictureWall } from '../../features/pictures/components/picture-wall.tsx';
import { useSight } from '../../hooks/use-membership.ts';
import { usePathId } from '../use-path-id.ts';

export function Component() {
  const commissionId = usePathId('commissionId');
  const { ability, isClient } = useSight(commissionId);
  const mayAdd = mayDo(ability, 'picture', 'Commission', { id: commissionId, memberKeys: [] });
  return (
    <PictureWall
      commissionId={commissionId}
      place="commission"
      placeId={commissionId}
      title="Pictures of the piece"
      purposes={!mayAdd ? [] : isClient ? ['brief'] : ['condition', 'brief', 'cover']}
    />
  );
}
