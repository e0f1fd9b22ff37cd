/** How much room there is: phone, tablet or wide. */
import { useWindowDimensions } from 'react-native';
import { layoutFor, type LayoutWidth } from './theme';

export const useLayout = (): LayoutWidth => layoutFor(useWindowDimensions().width);
