import { BareGrid } from './bare-grid'

export default function Page() {
  return <BareGrid />
}
