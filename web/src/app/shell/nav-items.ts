import type { MemberPermission } from '@furrowlight/shared/access/permissions';
import {
  IconBuildingCottage,
  IconCloudRain,
  IconLifebuoy,
  IconMap2,
  IconSunHigh,
  IconTableRow,
  IconUsersGroup,
  type Icon,
} from '@tabler/icons-react';

export interface NavItem {
  to: string;
  label: string;
  icon: Icon;
  /** Second key after `g`. */
  key: string;
  /** Shown only to those who hold it. */
  needs?: MemberPermission;
}

export const NAV: readonly NavItem[] = [
  { to: '/', label: 'Desk', icon: IconTableRow, key: 'd' },
  { to: '/fields', label: 'Fields', icon: IconMap2, key: 'f' },
  { to: '/farms', label: 'Farms', icon: IconBuildingCottage, key: 'a' },
  { to: '/weather', label: 'Weather', icon: IconCloudRain, key: 'w' },
];

export const NAV_MORE: readonly NavItem[] = [
  {
    to: '/cooperative',
    label: 'Cooperative',
    icon: IconUsersGroup,
    key: 'c',
    needs: 'members:read',
  },
  { to: '/how-we-know', label: 'How we know', icon: IconSunHigh, key: 'k' },
  { to: '/help', label: 'Help', icon: IconLifebuoy, key: 'h' },
];
