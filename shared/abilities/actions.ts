/** Every act the rules speak of. */
export type Action =
  | 'read'
  | 'create'
  | 'update'
  | 'invite'
  | 'remove'
  | 'move' // a leg or a handoff on
  | 'drop' // a leg
  | 'measure' // add readings
  | 'raise' // a fit report on a joint
  | 'answer'
  | 'agree'
  | 'rework'
  | 'verify'
  | 'withdraw'
  | 'word' // write what the client reads
  | 'consent'
  | 'offer' // offer, counter, accept, decline a day
  | 'receive'
  | 'post'
  | 'picture' // add files
  | 'administer';
