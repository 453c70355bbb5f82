import { ShopPage } from '../../features/shop/components/shop-page.tsx';
import { usePathId } from '../use-path-id.ts';

export const Component = () => <ShopPage shopId={usePathId('shopId')} />;
