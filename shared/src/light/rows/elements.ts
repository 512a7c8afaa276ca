/** How finely surfaces and directions are cut for diffuse exchange. */
export interface Cut {
  /** Ground strips across one pitch. */
  ground: number;
  /** Strips of each panel face along the slant. */
  face: number;
  /** Profile directions from horizon to horizon. */
  directions: number;
}

/** Elements in one vector: ground strips, then front strips (upper to lower edge), then rear strips. */
export const elementCount = (cut: Cut): number => cut.ground + 2 * cut.face;

/** Strip of `count` on which a share 0-1 of a length falls. */
export const stripAt = (share: number, count: number): number =>
  Math.min(Math.max(Math.floor(share * count), 0), count - 1);
