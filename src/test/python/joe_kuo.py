"""Writes src/main/resources/dev/leadline/scheme/joe-kuo-d6.txt, direction numbers of Sobol's sequence.

They are those of new-joe-kuo-6.21201, as scipy carries them.
Run from the root of the project: /usr/bin/python3 src/test/python/joe_kuo.py
"""

import pathlib

import numpy as np
import scipy.stats

DIMENSIONS = 1111
HEAD = """\
Direction numbers of Sobol's sequence, dimensions 2 to 1111: the first of new-joe-kuo-6.21201, criterion D(6).
S. Joe and F. Y. Kuo (2008), Constructing Sobol sequences with better two-dimensional projections,
SIAM J. Sci. Comput. 30, 2635-2654. https://web.maths.unsw.edu.au/~fkuo/sobol/
One dimension a line: the primitive polynomial, its coefficients as the digits of a binary number, then m_1, m_2 ...
Written by src/test/python/joe_kuo.py.

Copyright (c) 2008, Frances Y. Kuo and Stephen Joe
All rights reserved.

Redistribution and use in source and binary forms, with or without modification, are permitted provided that the
following conditions are met:

  * Redistributions of source code must retain the above copyright notice, this list of conditions and the following
    disclaimer.

  * Redistributions in binary form must reproduce the above copyright notice, this list of conditions and the following
    disclaimer in the documentation and/or other materials provided with the distribution.

  * Neither the names of the copyright holders nor the names of the University of New South Wales and the University of
    Waikato and its contributors may be used to endorse or promote products derived from this software without specific
    prior written permission.

THIS SOFTWARE IS PROVIDED BY THE COPYRIGHT HOLDERS ``AS IS'' AND ANY EXPRESS OR IMPLIED WARRANTIES, INCLUDING, BUT NOT
LIMITED TO, THE IMPLIED WARRANTIES OF MERCHANTABILITY AND FITNESS FOR A PARTICULAR PURPOSE ARE DISCLAIMED. IN NO EVENT
SHALL THE COPYRIGHT HOLDERS BE LIABLE FOR ANY DIRECT, INDIRECT, INCIDENTAL, SPECIAL, EXEMPLARY, OR CONSEQUENTIAL DAMAGES
(INCLUDING, BUT NOT LIMITED TO, PROCUREMENT OF SUBSTITUTE GOODS OR SERVICES; LOSS OF USE, DATA, OR PROFITS; OR BUSINESS
INTERRUPTION) HOWEVER CAUSED AND ON ANY THEORY OF LIABILITY, WHETHER IN CONTRACT, STRICT LIABILITY, OR TORT (INCLUDING
NEGLIGENCE OR OTHERWISE) ARISING IN ANY WAY OUT OF THE USE OF THIS SOFTWARE, EVEN IF ADVISED OF THE POSSIBILITY OF SUCH
DAMAGE.
"""

numbers = np.load(pathlib.Path(scipy.stats.__file__).parent / "_sobol_direction_numbers.npz")
with open("src/main/resources/dev/leadline/scheme/joe-kuo-d6.txt", "w") as out:
    for line in HEAD.splitlines():
        out.write(("# " + line).rstrip() + "\n")
    for polynomial, initial in zip(numbers["poly"][1:DIMENSIONS], numbers["vinit"][1:DIMENSIONS]):
        degree = int(polynomial).bit_length() - 1
        assert not initial[degree:].any()
        out.write(" ".join(str(v) for v in [polynomial, *initial[:degree]]) + "\n")
