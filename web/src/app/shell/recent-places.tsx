import { Link } from 'react-router-dom';
import { useRecent } from '../../lib/recent';
import classes from './recent-places.module.css';

/** The fields opened lately, one step away. */
export function RecentPlaces({ memberId }: { memberId: string }) {
  const recent = useRecent(memberId);
  if (recent.length === 0) return null;
  return (
    <nav aria-labelledby="recent-title" className={classes.recent}>
      <h2 id="recent-title">Lately</h2>
      <ul>
        {recent.map((place) => (
          <li key={place.to}>
            <Link to={place.to}>
              <span>{place.label}</span>
              <small>{place.under}</small>
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  );
}
