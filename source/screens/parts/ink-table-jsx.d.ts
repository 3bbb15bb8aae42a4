// ink-table's types name the global JSX namespace, which the types of React no longer have.
import type {JSX as ReactJsx} from 'react';

declare global {
	namespace JSX {
		type Element = ReactJsx.Element;
	}
}
