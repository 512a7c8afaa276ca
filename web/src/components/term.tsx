import { Popover, Text } from '@mantine/core';
import { useDisclosure } from '@mantine/hooks';
import { useId, type ReactNode } from 'react';
import { GLOSSARY, type GlossaryWord } from '../lib/glossary';
import classes from './term.module.css';

/** A trade word that explains itself on hover, focus or touch. */
export function Term({ of, children }: { of: GlossaryWord; children?: ReactNode }) {
  const [opened, { open, close }] = useDisclosure(false);
  const id = useId();
  const entry = GLOSSARY[of];
  return (
    <span onMouseEnter={open} onMouseLeave={close} className={classes.frame}>
      <Popover
        opened={opened}
        onChange={(next) => !next && close()}
        position="top"
        offset={4}
        width={280}
        withinPortal={false}
      >
        <Popover.Target>
          <button
            type="button"
            className={classes.term}
            aria-describedby={opened ? id : undefined}
            aria-expanded={opened}
            onFocus={open}
            onBlur={close}
            onClick={open}
            onKeyDown={(event) => event.key === 'Escape' && close()}
          >
            {children ?? of}
          </button>
        </Popover.Target>
        <Popover.Dropdown className={classes.card} role="tooltip" id={id}>
          <Text component="span" display="block" size="sm" fw={600}>
            {entry.name}
          </Text>
          <Text component="span" display="block" size="sm" mt={4}>
            {entry.text}
          </Text>
        </Popover.Dropdown>
      </Popover>
    </span>
  );
}
