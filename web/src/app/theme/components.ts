import type { MantineThemeComponents } from '@mantine/core';
import classes from './components.module.css';

/** The look of Mantine's parts in paper and ink; one place, so that no page styles its own.
 * Plain objects: the parts themselves stay out of the first page's JavaScript. */
export const components: MantineThemeComponents = {
  ActionIcon: { classNames: { root: classes.onLeaf } },
  Badge: { classNames: { root: classes.onLeaf } },
  Button: { classNames: { root: classes.button } },
  Input: { classNames: { input: classes.input } },
  InputWrapper: {
    defaultProps: { inputWrapperOrder: ['label', 'description', 'input', 'error'] },
    classNames: {
      label: classes.label,
      description: classes.description,
      error: classes.error,
      required: classes.required,
    },
  },
  Checkbox: { classNames: { input: classes.checkbox } },
  SegmentedControl: {
    classNames: {
      root: classes.segments,
      indicator: classes.segmentIndicator,
      label: classes.segmentLabel,
    },
  },
  Tabs: { classNames: { tab: classes.tab, list: classes.tabList } },
  Paper: { classNames: { root: classes.paper } },
  Modal: {
    defaultProps: { overlayProps: { backgroundOpacity: 0.45, color: '#0D1315' }, radius: 'md' },
    classNames: { content: classes.dialog, header: classes.dialogHead, title: classes.dialogTitle },
  },
  Drawer: {
    defaultProps: { overlayProps: { backgroundOpacity: 0.45, color: '#0D1315' } },
    classNames: { content: classes.dialog, header: classes.dialogHead, title: classes.dialogTitle },
  },
  Menu: { classNames: { dropdown: classes.dropdown, item: classes.item } },
  Popover: { classNames: { dropdown: classes.dropdown } },
  Tooltip: {
    defaultProps: { events: { hover: true, focus: true, touch: false } },
    classNames: { tooltip: classes.tooltip },
  },
  Table: { classNames: { th: classes.th, td: classes.td, tr: classes.tr } },
  Select: { defaultProps: { withScrollArea: false }, classNames: { options: classes.options } },
  Skeleton: { classNames: { root: classes.skeleton } },
  Notifications: { classNames: { root: classes.notices } },
  Notification: { classNames: { root: classes.notification } },
};
