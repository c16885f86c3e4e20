import { register } from 'tsx/esm/api'

// `--import tsx` itself does nothing in a thread: it registers on the main one only.
register()
