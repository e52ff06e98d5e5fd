import Svg, { Circle, Path } from 'react-native-svg';
import { iconSize } from '../theme/tokens';
import { useTheme } from '../theme/use-theme';

type MarkProps = { readonly size?: keyof typeof iconSize };

/** The product's mark: an elbow of two lines that meet at a small open circle. */
export function Mark({ size = 'l' }: MarkProps) {
  const { color } = useTheme();
  return (
    <Svg width={iconSize[size]} height={iconSize[size]} viewBox="0 0 24 24" fill="none" aria-hidden>
      <Path d="M5.5 2v13.6M8.9 19H22.5" stroke={color.ink} strokeWidth={2.25} />
      <Circle cx={5.5} cy={19} r={3.1} stroke={color.action} strokeWidth={2.25} />
    </Svg>
  );
}
